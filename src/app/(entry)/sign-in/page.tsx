import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { Mark } from "@/components/shell/mark";
import { pages } from "@/contracts/paths";
import { SignInAxis } from "@/features/session/sign-in-axis";
import { SignInForm } from "@/features/session/sign-in-form";
import { currentViewer } from "@/server/auth/viewer";
import { listDemoAccounts } from "@/server/demo/read";

export const metadata: Metadata = { title: "Sign in" };

export default async function SignInPage({ searchParams }: { searchParams: Promise<{ next?: string | string[] }> }) {
  if (await currentViewer()) redirect(pages.desk);
  const { next } = await searchParams;
  const demoAccounts = await listDemoAccounts();

  return (
    <main
      id="main"
      tabIndex={-1}
      className="relative grid min-h-screen overflow-hidden bg-sheet focus:outline-none phone:flex phone:flex-col phone:justify-between"
    >
      <div className="relative z-10 mb-8 ml-6 mr-24 mt-16 w-[min(420px,calc(100%-48px))] self-start justify-self-end border-b-3 border-t-2 border-double border-ink bg-sheet pb-7 pt-[26px] [border-top-style:solid] rail:mr-6 phone:mx-6 phone:mt-7 phone:w-auto">
        <h1 className="flex items-center gap-3 font-serif text-verdict font-semibold">
          <Mark size={40} />
          Ebbmark
        </h1>
        <p className="mt-2.5 font-serif text-meaning text-ink-2">
          How a pressurised section empties, how cold it gets, and what that rests on.
        </p>
        <SignInForm demoAccounts={demoAccounts} {...(typeof next === "string" ? { next } : {})} />
        <p className="mt-5 font-serif text-body italic text-ink-3">
          A screening aid. It does not replace the review of a licensed engineer or the code that applies at your site.
        </p>
      </div>
      <SignInAxis />
    </main>
  );
}
