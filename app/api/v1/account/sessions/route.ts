import { door } from "@/lib/http/door";
import { signOutEverywhere } from "@/lib/services/accounts/sign-out-everywhere";

export const DELETE = door("DELETE /account/sessions", ({ actor }) => signOutEverywhere(actor));
