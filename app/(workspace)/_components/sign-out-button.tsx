"use client";

import { signOut } from "next-auth/react";
import { useState } from "react";

export function SignOutButton() {
  const [busy, setBusy] = useState(false);

  async function leave() {
    setBusy(true);
    await signOut({ redirect: false });
    // A full load: nothing that was read in this session may stay in the window.
    window.location.assign("/sign-in");
  }

  return (
    <button type="button" disabled={busy} onClick={leave} className="py-1 hover:text-ink hover:underline">
      Sign out
    </button>
  );
}
