import { withTeam } from "@/lib/http/with-team";
import { readBoard } from "@/lib/services/board/read-board";

export const GET = withTeam(readBoard, { may: "board.read" });
