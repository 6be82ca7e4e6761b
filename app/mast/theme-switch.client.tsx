"use client";

import { useSyncExternalStore } from "react";

type Theme = "paper" | "blueprint";

/** Changes between paper and blueprint at once; the server keeps the choice in a cookie. */
export function ThemeSwitch() {
  const theme = useSyncExternalStore<Theme>(onThemeChange, currentTheme, () => "paper");
  const other: Theme = theme === "paper" ? "blueprint" : "paper";
  return (
    <button
      type="button"
      className="btn quiet"
      onClick={() => {
        document.documentElement.dataset["theme"] = other;
        // The page already shows it; should keeping it fail, only the next visit is affected.
        fetch("/api/theme", { method: "POST", body: other }).catch(() => undefined);
      }}
    >
      {other === "paper" ? "Paper" : "Blueprint"}
    </button>
  );
}

function currentTheme(): Theme {
  return document.documentElement.dataset["theme"] === "blueprint" ? "blueprint" : "paper";
}

function onThemeChange(changed: () => void): () => void {
  const observer = new MutationObserver(changed);
  observer.observe(document.documentElement, { attributeFilter: ["data-theme"] });
  return () => observer.disconnect();
}
