import { withCamp } from "@/lib/http/with-team";
import { acceptSuggestionSchema } from "@/lib/schemas/suggestion";
import { acceptSuggestion } from "@/lib/services/suggestions/decide";

export const POST = withCamp(acceptSuggestion, { may: "suggestions.decide", body: acceptSuggestionSchema });
