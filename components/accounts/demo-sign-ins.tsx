import { Tag } from "@/components/ui/tag";
import { ROLE_LABEL } from "@/lib/core/roles";
import type { DemoSignIn } from "@/lib/schemas/accounts";

type DemoSignInsProps = {
  signIns: readonly DemoSignIn[];
  mailSinkUrl: string | null;
  busy: boolean;
  onChoose: (signIn: DemoSignIn) => void;
};

/** Only in a demonstration: one press signs in as one of its invented people. */
export function DemoSignIns({ signIns, mailSinkUrl, busy, onChoose }: DemoSignInsProps) {
  return (
    <section aria-labelledby="demo" className="grid gap-3 border-t border-rule pt-5">
      <div className="flex flex-wrap items-center gap-3">
        <h2 id="demo" className="text-[1.4rem] leading-tight">
          Look around as
        </h2>
        <Tag>demonstration</Tag>
      </div>
      <p className="text-sm text-ink2">Everybody and everything in this demonstration is invented. One press signs you in.</p>
      <ul className="grid gap-2">
        {signIns.map((signIn) => (
          <li key={signIn.email}>
            <button
              type="button"
              disabled={busy}
              onClick={() => onChoose(signIn)}
              className="flex min-h-14 w-full items-center justify-between gap-4 rounded border-[1.5px] border-steel bg-chalk px-4 py-2 text-left hover:border-strong hover:bg-tint disabled:opacity-60"
            >
              <span>
                <span className="block font-semibold">{signIn.name}</span>
                <span className="block text-sm text-ink2">{signIn.organisation}</span>
              </span>
              <span className="font-plate text-[1.15rem] font-semibold text-strong">{ROLE_LABEL[signIn.role]}</span>
            </button>
          </li>
        ))}
      </ul>
      {mailSinkUrl && (
        <p className="text-sm text-ink2">
          Letters of the demonstration go nowhere.{" "}
          <a href={mailSinkUrl} className="text-strong underline underline-offset-4">
            See what was sent
          </a>
        </p>
      )}
    </section>
  );
}
