import { Page } from "@/components/frame/sheet";
import { LinkButton } from "@/components/ui/button";
import { EmptyPlace } from "@/components/ui/notice";

/** The same for what isn't there and for what somebody may not see: neither says which. */
export default function NotFoundHere() {
  return (
    <Page narrow>
      <h1 className="mb-4 text-[2rem] leading-[1.05]">Nothing here for you</h1>
      <EmptyPlace title="This page is not there, or your role here does not see it" action={<LinkButton href="/">Go to today</LinkButton>}>
        Perhaps the address is old, or it belongs to another of your roles: the menu with your name shows them.
      </EmptyPlace>
    </Page>
  );
}
