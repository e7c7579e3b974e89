import { withCamp } from "@/lib/http/with-team";
import { saveEditSchema } from "@/lib/schemas/prescription";
import { saveEdit } from "@/lib/services/prescription/save-edit";

export const PUT = withCamp(saveEdit, { may: "prescription.write", body: saveEditSchema });
