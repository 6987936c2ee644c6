import type { Metadata, Viewport } from "next";
import { cookies, headers } from "next/headers";
import type { ReactNode } from "react";
import { PlainCopy } from "@/components/quantity/plain-copy";
import { readTheme, themeAttribute, themeCookie } from "@/components/theme/theme";
import { readUnitSystem, unitsCookie } from "@/components/units/unit-system";
import { UnitsProvider } from "@/components/units/units-provider";
import "./globals.css";

export const metadata: Metadata = {
  title: { default: "Ebbmark", template: "%s · Ebbmark" },
  description: "Safety-case relief and blowdown energy screening",
};

export const viewport: Viewport = { width: "device-width", initialScale: 1, colorScheme: "light dark" };

export default async function RootLayout({ children }: { children: ReactNode }) {
  // Reading the request makes every page dynamic: a page built ahead of time would carry no nonce, and its scripts would be refused.
  await headers();
  const kept = await cookies();

  return (
    <html lang="en" data-theme={themeAttribute(readTheme(kept.get(themeCookie)?.value))}>
      <body>
        <a href="#main" className="absolute -left-[999px] top-2 z-50 bg-sheet p-2 focus:left-3">
          Skip to the sheet
        </a>
        <UnitsProvider initial={readUnitSystem(kept.get(unitsCookie)?.value)}>{children}</UnitsProvider>
        <PlainCopy />
      </body>
    </html>
  );
}
