import { withCamp } from "@/lib/http/with-team";
import { dismissSuggestionSchema } from "@/lib/schemas/suggestion";
import { dismissSuggestion } from "@/lib/services/suggestions/decide";

export const POST = withCamp(dismissSuggestion, { may: "suggestions.decide", body: dismissSuggestionSchema });
