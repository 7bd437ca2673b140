import { PublicFrame } from "@/components/accounts/public-frame";
import { Bolt } from "@/components/bolt/bolt";
import { LinkButton } from "@/components/ui/button";
import type { Standing } from "@/lib/core/standing/types";

const SIGNED: Standing = { held: { kind: "level", level: 4, until: "" }, next: "not_open" };

const CHAIN = [
  { title: "Recording", text: "A mentor films a real job and talks it through. It is marked out into steps, with values, tools, cautions and questions." },
  { title: "Module", text: "The apprentice learns the job step by step, is asked what matters, and finds any step again beside the vehicle." },
  { title: "Task", text: "An assessor watches it done on a real vehicle, with readings held against their limits, and decides." },
  { title: "Sign-off", text: "The decision stands with its evidence: who saw what, when, and at which level of supervision it may be done." },
];

/** What Witnessline is, to somebody who comes without a letter. */
export function FrontPage({ demo }: { demo: boolean }) {
  return (
    <PublicFrame aside={<LinkButton href="/sign-in">Sign in</LinkButton>}>
      <main id="main" tabIndex={-1} className="mx-auto w-full max-w-5xl px-4 py-8 outline-none sm:px-6 sm:py-16">
        <div className="grid items-center gap-8 sm:grid-cols-[1fr_auto]">
          <div>
            <h1 className="max-w-[20ch] text-balance text-[2.6rem] leading-[1.02] sm:text-[3.6rem]">A line across the bolt, for work that people do</h1>
            <p className="mt-5 max-w-[60ch] text-[1.15rem]">
              When a safety-critical fastener has been tightened, a line of paint is drawn across its head and the part. Anyone can see later
              that it was done, and whether it has moved. Witnessline does that for a trade: recordings of real repair jobs become training,
              and the training becomes sign-offs that anyone can check later.
            </p>
            <div className="mt-6 flex flex-wrap gap-3">
              <LinkButton href="/sign-in" kind="main" className="min-h-14 px-8 text-[1.4rem]">
                {demo ? "Look around" : "Sign in"}
              </LinkButton>
            </div>
            <p className="mt-4 max-w-[60ch] text-ink2">
              {demo
                ? "This is a demonstration: its workshops, its college, its people and its values are invented."
                : "You join by an invitation from your workshop or college. It comes by mail."}
            </p>
          </div>
          <div className="hidden sm:block">
            <Bolt standing={SIGNED} size={200} label="" />
          </div>
        </div>
        <ol className="mt-12 grid gap-px overflow-hidden rounded border border-rule bg-rule sm:grid-cols-2 lg:grid-cols-4">
          {CHAIN.map((link, index) => (
            <li key={link.title} className="bg-sheet px-5 py-5">
              <p className="flex items-baseline gap-2.5 font-plate text-[1.5rem] font-semibold leading-tight">
                <span className="text-steel">{index + 1}</span>
                {link.title}
              </p>
              <p className="mt-1.5 text-ink2">{link.text}</p>
            </li>
          ))}
        </ol>
      </main>
    </PublicFrame>
  );
}
