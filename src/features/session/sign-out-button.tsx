"use client";

import { useMutation } from "@tanstack/react-query";
import { Button } from "@/components/button/button";
import { endpoints, pages } from "@/contracts/paths";
import { deleteJson } from "@/features/query/fetch-json";
import { isRefused, wordsOf } from "@/features/query/refused-error";

/** Ends the session on the server and leaves for the sign-in page. */
export function SignOutButton() {
  const signOut = useMutation({
    mutationFn: () => deleteJson(endpoints.session),
    onSuccess: leave,
    // A session that is gone already is what was asked for.
    onError: (error) => isRefused(error, "not-signed-in") && leave(),
  });
  return (
    <div>
      <Button full busy={signOut.isPending} onClick={() => signOut.mutate()}>
        Sign out
      </Button>
      {signOut.isError && (
        <p role="alert" className="pt-1 text-note text-beyond">
          {wordsOf(signOut.error)} You are still signed in.
        </p>
      )}
    </div>
  );
}

/** By a whole new page, so that nothing read by one person stays in the memory of the tab. */
function leave(): void {
  window.location.assign(pages.signIn);
}
