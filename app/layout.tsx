import type { Metadata } from "next";
import { cookies } from "next/headers";
import type { ReactNode } from "react";
import "./look/look.css";

export const metadata: Metadata = {
  title: { default: "Ampersign", template: "%s: Ampersign" },
  description: "Electrical design reviews: what changed, what moved, what is stressed, who signed.",
};

/** Every page: the choice of paper or blueprint is drawn from the first byte. */
export default async function RootLayout(props: { readonly children: ReactNode }) {
  const kept = (await cookies()).get("theme")?.value;
  return (
    <html lang="en" data-theme={kept === "blueprint" ? "blueprint" : "paper"}>
      <body>{props.children}</body>
    </html>
  );
}
