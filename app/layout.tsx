import type { Metadata, Viewport } from "next";
import localFont from "next/font/local";
import { connection } from "next/server";
import type { ReactNode } from "react";
import { SiteFooter } from "@/components/layout/site-footer";
import { SiteHeader } from "@/components/layout/site-header";
import { env } from "@/lib/shared/env";
import { currentLook } from "@/lib/web/look";
import { currentActor } from "@/lib/web/session";
import "./globals.css";

const latin = localFont({
  src: "../fonts/atkinson-hyperlegible-next-latin.woff2",
  weight: "200 800",
  variable: "--font-latin",
  display: "swap",
});
const latinExt = localFont({
  src: "../fonts/atkinson-hyperlegible-next-latin-ext.woff2",
  weight: "200 800",
  variable: "--font-latin-ext",
  display: "swap",
  preload: false,
  declarations: [{ prop: "unicode-range", value: "U+0100-02BA, U+02BD-02C5, U+02C7-02CC, U+1E00-1E9F, U+1EF2-1EFF, U+2020, U+20A0-20AB, U+20AD-20C0" }],
});

export async function generateMetadata(): Promise<Metadata> {
  await connection();
  const programme = env().PROGRAMME_NAME;
  return {
    title: { default: `${programme}: outings to listen, record and touch`, template: `%s - ${programme}` },
    description: "Outings to public land for blind and partially sighted young people, with guides, chaperones and teaching models.",
  };
}

export const viewport: Viewport = { width: "device-width", initialScale: 1 };

export default async function RootLayout({ children }: { children: ReactNode }) {
  const [actor, look] = [await currentActor(), await currentLook()];
  return (
    <html
      lang="en"
      className={`${latin.variable} ${latinExt.variable}`}
      data-theme={look.theme === "as the device" ? undefined : look.theme}
      data-text={look.text === "100" ? undefined : look.text}
    >
      <body>
        <a href="#content" className="skip">
          Skip to the content
        </a>
        <SiteHeader actor={actor} />
        <main id="content" tabIndex={-1} className="frame">
          {children}
        </main>
        <SiteFooter programme={env().PROGRAMME_NAME} phone={env().PROGRAMME_PHONE} />
      </body>
    </html>
  );
}
