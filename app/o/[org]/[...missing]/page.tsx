import { notFound } from "next/navigation";
import { requireActor } from "@/lib/http/page";

/** Any address of an organisation that is no page: told inside the rail, so that the way back is at hand. */
export default async function MissingPage({ params }: { params: Promise<{ org: string; missing: string[] }> }) {
  const { org, missing } = await params;
  await requireActor(org, `/${missing.join("/")}`);
  notFound();
}
