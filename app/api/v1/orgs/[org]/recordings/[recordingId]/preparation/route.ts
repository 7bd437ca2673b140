import { door } from "@/lib/http/door";
import { prepareAgain } from "@/lib/services/recordings/prepare-again";

export const POST = door("POST /orgs/{org}/recordings/{recordingId}/preparation", ({ actor, params }) => prepareAgain(actor, params.recordingId));
