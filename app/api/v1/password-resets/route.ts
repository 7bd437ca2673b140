import { door } from "@/lib/http/door";
import { askForNewPassword } from "@/lib/services/accounts/ask-for-new-password";

export const POST = door("POST /password-resets", ({ body }) => askForNewPassword(body.email));
