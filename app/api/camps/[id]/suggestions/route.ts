import { withCamp } from "@/lib/http/with-team";
import { listSuggestions } from "@/lib/services/suggestions/waiting";

export const GET = withCamp(listSuggestions, { may: "suggestions.decide" });
