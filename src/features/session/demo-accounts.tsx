import { Button } from "@/components/button/button";
import { roleWords } from "@/contracts/roles";
import type { DemoAccountView } from "@/contracts/views";

/** The people of the demo with their passwords, in the open: only where the demo is loaded. */
export function DemoAccounts({
  accounts,
  onUse,
}: {
  accounts: readonly DemoAccountView[];
  onUse: (account: DemoAccountView) => void;
}) {
  return (
    <section aria-labelledby="demo-accounts" className="mt-6">
      <h2 id="demo-accounts" className="text-sub">
        Demo accounts
      </h2>
      <p className="pb-1.5 font-serif text-note text-ink-3">
        This installation holds the demo. People, plant and figures are invented.
      </p>
      <ul className="border-t">
        {accounts.map((account) => (
          <li key={account.badge} className="flex items-center justify-between gap-3 border-b py-1.5">
            <span className="min-w-0">
              <b>{roleWords[account.role]}</b> {account.badge} <span className="text-ink-3">{account.printedName}</span>
              <span className="block break-all font-cond text-note">{account.password || "has a password of its own now"}</span>
            </span>
            {account.password && (
              <Button kind="quiet" aria-label={`Fill in ${account.badge}`} onClick={() => onUse(account)}>
                Fill in
              </Button>
            )}
          </li>
        ))}
      </ul>
    </section>
  );
}
