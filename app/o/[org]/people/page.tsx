import type { Metadata } from "next";
import { PageHead } from "@/components/frame/page-head";
import { Page, Sheet, SheetPart } from "@/components/frame/sheet";
import { Invitations } from "@/components/people/invitations";
import { InviteButton } from "@/components/people/invite-button";
import { Members } from "@/components/people/members";
import { requireActor, view } from "@/lib/http/page";
import { viewPeople } from "@/lib/services/people/view-people";

export const metadata: Metadata = { title: "People" };

/** Who belongs to the organisation, as what, and who is asked to. */
export default async function PeoplePage({ params }: { params: Promise<{ org: string }> }) {
  const { org } = await params;
  const actor = await requireActor(org, "/people");
  const people = await view(viewPeople(actor));
  const waiting = people.invitations.length;
  return (
    <Page>
      <PageHead
        title="People"
        next={
          waiting === 0
            ? `${people.members.length} belong to ${actor.organisation.name}. Nobody is waiting to join.`
            : `${people.members.length} belong to ${actor.organisation.name}; ${waiting} ${waiting === 1 ? "invitation waits" : "invitations wait"} for an answer.`
        }
        actions={<InviteButton org={org} roles={people.roles} />}
      />
      <div className="grid gap-5">
        <Sheet>
          <Members org={org} organisation={actor.organisation.name} roles={people.roles} members={people.members} />
        </Sheet>
        {waiting > 0 && (
          <Sheet>
            <SheetPart title="Invited">
              <Invitations org={org} roles={people.roles} invitations={people.invitations} />
            </SheetPart>
          </Sheet>
        )}
      </div>
    </Page>
  );
}
