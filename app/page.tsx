import { redirect } from "next/navigation";
import { FrontPage } from "@/components/accounts/front-page";
import { findSignedIn } from "@/lib/auth/actor";
import { findWayIn } from "@/lib/services/accounts/find-way-in";
import { viewDemoSignIns } from "@/lib/services/accounts/view-demo-sign-ins";

/** To whoever is signed in, the way to today's work; to anybody else, what this is. */
export default async function RootPage() {
  const signedIn = await findSignedIn();
  if (signedIn) redirect((await findWayIn(signedIn.personId)) ?? "/account");
  return <FrontPage demo={(await viewDemoSignIns()) !== undefined} />;
}
