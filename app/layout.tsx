import "@fontsource/barlow-condensed/500.css";
import "@fontsource/barlow-condensed/600.css";
import "@fontsource-variable/atkinson-hyperlegible-next";
import "@fontsource-variable/atkinson-hyperlegible-mono";
import "./globals.css";
import type { Metadata, Viewport } from "next";
import { cookies } from "next/headers";
import type { ReactNode } from "react";

export const metadata: Metadata = {
  title: { default: "Witnessline", template: "%s · Witnessline" },
  description: "Recordings of real repair jobs become training, and the training becomes sign-offs that anyone can check later.",
};

export const viewport: Viewport = { width: "device-width", initialScale: 1, themeColor: "#2b4a43" };

/** Every page is made for one request: the session and the nonce of the script policy are only known then. */
export default async function RootLayout({ children }: { children: ReactNode }) {
  const theme = (await cookies()).get("theme")?.value;
  return (
    <html lang="en" {...(theme === "light" || theme === "dark" ? { "data-theme": theme } : {})}>
      <body>
        <a
          href="#main"
          className="sr-only focus:not-sr-only focus:fixed focus:left-3 focus:top-3 focus:z-50 focus:bg-chalk focus:px-4 focus:py-2 focus:text-ink"
        >
          Skip to the page
        </a>
        {children}
      </body>
    </html>
  );
}
