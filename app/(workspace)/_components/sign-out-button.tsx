"use client";

import { signOut } from "next-auth/react";
import { useState } from "react";

import { loadAnew } from "@/app/_components/load-anew";

export function SignOutButton() {
  const [busy, setBusy] = useState(false);

  async function leave() {
    setBusy(true);
    await signOut({ redirect: false });
    loadAnew("/sign-in");
  }

  return (
    <button type="button" disabled={busy} onClick={leave} className="py-1 hover:text-ink hover:underline">
      Sign out
    </button>
  );
}
