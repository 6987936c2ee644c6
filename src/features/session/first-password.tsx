"use client";

import { pages } from "@/contracts/paths";
import { ChangePasswordForm } from "./change-password-form";
import { SignOutButton } from "./sign-out-button";

/** The page that stands between a first password and everything else. */
export function FirstPassword() {
  return (
    <>
      <ChangePasswordForm onChanged={() => window.location.assign(pages.desk)} />
      <div className="mt-8 max-w-[180px]">
        <SignOutButton />
      </div>
    </>
  );
}
