import { door } from "@/lib/http/door";
import { signOutDevice } from "@/lib/services/accounts/sign-out-device";

export const DELETE = door("DELETE /account/sessions/{sessionId}", ({ actor, params }) => signOutDevice(actor, params.sessionId));
