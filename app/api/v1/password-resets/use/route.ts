import { door } from "@/lib/http/door";
import { setNewPassword } from "@/lib/services/accounts/set-new-password";

export const POST = door("POST /password-resets/use", ({ body }) => setNewPassword(body));
