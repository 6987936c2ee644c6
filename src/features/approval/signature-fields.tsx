"use client";

import Link from "next/link";
import { Button } from "@/components/button/button";
import { Notice } from "@/components/caution/notice";
import { Labelled } from "@/components/line/labelled";
import { PasswordField } from "@/components/line/password-field";
import { pages } from "@/contracts/paths";
import { isRefused, UnreachableError, wordsOf } from "@/features/query/refused-error";
import type { Signature } from "./use-signature";

type Props = {
  screeningId: string;
  signature: Signature;
  password: string;
  onPassword: (password: string) => void;
  /** What is still missing, in a sentence; null when the act can be done. */
  missing: string | null;
  onSend: () => void;
  /** "Sign and hand over" */
  label: string;
  kind?: "main" | "danger";
};

/** True while an answer is awaited or was lost: what was sent stays as it is, so that sending again repeats the same act. */
export const isHeld = ({ isPending, error }: Pick<Signature, "isPending" | "error">): boolean =>
  isPending || error instanceof UnreachableError;

/** The password, the button, and whatever stood in the way. A wrong password keeps everything else. */
export function SignatureFields({ screeningId, signature, password, onPassword, missing, onSend, label, kind = "main" }: Props) {
  const { error, isPending, variables } = signature;
  const lost = error instanceof UnreachableError && !isPending;
  const passwordWrong = isRefused(error, "wrong-credentials") && !isPending;
  const changed =
    isRefused(error, "content-changed") || isRefused(error, "repeat-differs") || isRefused(error, "already-decided");

  return (
    <>
      <Labelled
        id="signature-password"
        label="Password, once more"
        error={passwordWrong ? "The password is not right. Nothing else you entered is lost." : undefined}
      >
        <PasswordField
          id="signature-password"
          value={password}
          onValueChange={onPassword}
          bad={passwordWrong}
          readOnly={isHeld(signature)}
          autoComplete="off"
          aria-describedby="signature-password-message"
        />
      </Labelled>
      {lost && (
        <div className="mt-4">
          <Notice tone="error" title="No answer came.">
            It may have been recorded or not. Sending again repeats the same act: nothing is recorded twice.
          </Notice>
        </div>
      )}
      {error && !lost && !passwordWrong && !isPending && (
        <div className="mt-4">
          <Notice tone="error">
            {wordsOf(error)} {changed && <Link href={pages.screening(screeningId)}>Read the record as it is now</Link>}
            <Problems error={error} />
          </Notice>
        </div>
      )}
      <div className="mt-5 grid gap-2">
        {lost && variables ? (
          <Button kind={kind} full onClick={() => signature.mutate(variables)}>
            Send again
          </Button>
        ) : (
          <Button kind={kind} full busy={isPending} waitsFor={missing} onClick={onSend}>
            {isPending ? "Recording…" : label}
          </Button>
        )}
      </div>
    </>
  );
}

function Problems({ error }: { error: unknown }) {
  const problems = isRefused(error) ? (error.problem.problems ?? []) : [];
  if (problems.length === 0) return null;
  return (
    <ul className="pt-1">
      {problems.map(({ path, message }) => (
        <li key={path}>
          <b className="font-cond text-label">{path}</b> {message}
        </li>
      ))}
    </ul>
  );
}
