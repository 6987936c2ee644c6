import type { Metadata } from "next";
import { PageHead } from "@/components/shell/page-head";
import { BarePage } from "@/components/shell/bare-page";
import { FirstPassword } from "@/features/session/first-password";
import { requireViewer } from "@/server/auth/viewer";

export const metadata: Metadata = { title: "Change password" };

export default async function ChangePasswordPage() {
  const viewer = await requireViewer({ evenIfPasswordMustChange: true });
  return (
    <BarePage>
      <PageHead title="Choose your own password" />
      <p className="max-w-[60ch] font-serif text-prose text-ink-2">
        {viewer.mustChangePassword
          ? `The password of ${viewer.badge} was set by an administrator. Nobody but you may know the one you sign with, so choose your own before you go on.`
          : `You are signed in as ${viewer.badge}. Your other sessions end when you change the password.`}
      </p>
      <FirstPassword />
    </BarePage>
  );
}
