"use client";

import { usePathname, useSearchParams } from "next/navigation";
import { WhoMenu } from "@/components/accounts/who-menu";
import { Rail } from "@/components/frame/rail";
import { placesFor } from "@/lib/core/places";
import type { Role } from "@/lib/core/roles";

type FrameView = {
  name: string;
  organisation: { slug: string; name: string };
  roles: { role: Role; label: string }[];
  posts: { key: string; role: Role; roleLabel: string; organisation: string; href: string }[];
};

/** The rail of the role to which the page in view belongs, and the person's own menu. It shows the way and decides nothing. */
export function MemberRail({ frame }: { frame: FrameView }) {
  const base = `/o/${frame.organisation.slug}`;
  const path = usePathname().slice(base.length);
  const as = useSearchParams().get("as");
  const { role, places } = placesFor(frame.roles.map((each) => each.role), path, as);
  const roleLabel = frame.roles.find((each) => each.role === role)?.label ?? "";
  return (
    <Rail
      home={`${base}/today`}
      places={places.map((place) => ({ ...place, href: `${base}${place.href}` }))}
      who={
        <WhoMenu
          name={frame.name}
          roleLabel={roleLabel}
          organisation={frame.organisation.name}
          current={`${frame.organisation.slug} ${role}`}
          posts={frame.posts}
        />
      }
    />
  );
}
