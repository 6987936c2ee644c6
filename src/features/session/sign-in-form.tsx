"use client";

import { useMutation } from "@tanstack/react-query";
import { useRef, useState, type FormEvent } from "react";
import { Button } from "@/components/button/button";
import { Labelled } from "@/components/line/labelled";
import { PasswordField } from "@/components/line/password-field";
import { TextField } from "@/components/line/text-field";
import { Notice } from "@/components/caution/notice";
import { keepInCookie } from "@/components/cookie";
import { themeCookie } from "@/components/theme/theme";
import { useUnits } from "@/components/units/units-provider";
import { endpoints, pages } from "@/contracts/paths";
import { signInSchema, type SignIn } from "@/contracts/requests";
import type { DemoAccountView, ViewerView } from "@/contracts/views";
import { postJson } from "@/features/query/fetch-json";
import { isRefused, wordsOf } from "@/features/query/refused-error";
import { DemoAccounts } from "./demo-accounts";
import { safeNext } from "./safe-next";

type Wrong = { badge?: string; password?: string };

/**
 * Badge and password.
 *
 * next           where to go afterwards; an address of this site, anything else counts as the desk
 * demoAccounts   listed under the form; empty unless the demo is loaded
 */
export function SignInForm({ next, demoAccounts }: { next?: string; demoAccounts: readonly DemoAccountView[] }) {
  const [badge, setBadge] = useState("");
  const [password, setPassword] = useState("");
  const [wrong, setWrong] = useState<Wrong>({});
  const passwordBox = useRef<HTMLInputElement>(null);
  const { setSystem } = useUnits();

  const signIn = useMutation({
    mutationFn: (body: SignIn) => postJson<ViewerView>(endpoints.session, body),
    onSuccess: (viewer) => {
      setSystem(viewer.units);
      if (viewer.theme) keepInCookie(themeCookie, viewer.theme);
      // A whole new page: whatever was drawn for a stranger is gone.
      window.location.assign(viewer.mustChangePassword ? pages.changePassword : safeNext(next));
    },
    onError: (error) => {
      if (!isRefused(error, "wrong-credentials")) return;
      setPassword("");
      passwordBox.current?.focus();
    },
  });

  const submit = (event: FormEvent) => {
    event.preventDefault();
    const parsed = signInSchema.safeParse({ badge, password });
    const wrongNow: Wrong = {};
    if (!parsed.success) {
      if (parsed.error.issues.some(({ path }) => path[0] === "badge"))
        wrongNow.badge = "Write your badge as on the card: letters, a hyphen, digits, such as E-114.";
      if (password === "") wrongNow.password = "Type your password.";
    }
    setWrong(wrongNow);
    if (parsed.success) signIn.mutate(parsed.data);
  };

  const credentialsWrong = isRefused(signIn.error, "wrong-credentials");

  return (
    <>
      <form onSubmit={submit} noValidate aria-label="Sign in">
        {signIn.isError && !signIn.isPending && !credentialsWrong && (
          <div className="mt-4">
            <Notice tone="error">{wordsOf(signIn.error)}</Notice>
          </div>
        )}
        <Labelled id="badge" label="Badge" error={wrong.badge}>
          <TextField
            id="badge"
            name="badge"
            value={badge}
            onValueChange={setBadge}
            tone={wrong.badge ? "bad" : "rest"}
            autoComplete="username"
            autoCapitalize="characters"
            spellCheck={false}
            aria-describedby={wrong.badge ? "badge-message" : undefined}
          />
        </Labelled>
        <Labelled
          id="password"
          label="Password"
          error={wrong.password ?? (credentialsWrong && !signIn.isPending ? wordsOf(signIn.error) : undefined)}
        >
          <PasswordField
            ref={passwordBox}
            id="password"
            name="password"
            value={password}
            onValueChange={setPassword}
            bad={Boolean(wrong.password) || credentialsWrong}
            aria-describedby="password-message"
          />
        </Labelled>
        <div className="mt-[22px] flex flex-wrap items-center gap-3">
          <Button kind="main" type="submit" busy={signIn.isPending}>
            {signIn.isPending ? "Signing in…" : "Sign in"}
          </Button>
        </div>
      </form>
      {demoAccounts.length > 0 && (
        <DemoAccounts
          accounts={demoAccounts}
          onUse={(account) => {
            setBadge(account.badge);
            setPassword(account.password);
            setWrong({});
            signIn.reset();
          }}
        />
      )}
    </>
  );
}
