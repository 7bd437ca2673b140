import { door } from "@/lib/http/door";
import { changePassword } from "@/lib/services/accounts/change-password";

export const PUT = door("PUT /account/password", ({ actor, body }) => changePassword(actor, body));
