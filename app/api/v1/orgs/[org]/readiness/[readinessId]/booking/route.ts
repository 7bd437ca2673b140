import { door } from "@/lib/http/door";
import { bookObservation } from "@/lib/services/observations/book-observation";

export const PUT = door("PUT /orgs/{org}/readiness/{readinessId}/booking", ({ actor, params, body }) =>
  bookObservation(actor, params.readinessId, body.startsAt),
);
