import { withCamp } from "@/lib/http/with-team";
import { dropSwapSchema, swapFormSchema } from "@/lib/schemas/prescription";
import { dropSwap, saveSwap } from "@/lib/services/prescription/swap";

export const POST = withCamp(saveSwap, { may: "prescription.swap", body: swapFormSchema });
export const DELETE = withCamp(dropSwap, { may: "prescription.swap", body: dropSwapSchema });
