"use client";

import "./globals.css";

interface GlobalErrorProps {
  error: Error & { digest?: string };
  retry: () => void;
}

/** The last net, when not even the frame of the pages could be made. */
export default function GlobalError({ error, retry }: GlobalErrorProps) {
  return (
    <html lang="en">
      <body>
        <title>Leeboard could not start this page</title>
        <main className="mx-auto max-w-3xl px-4 py-10">
          <h1 className="text-xl">This page could not be made</h1>
          <p className="my-3">The fault is ours. Reference for the log of the server: {error.digest ?? "none"}.</p>
          <button type="button" className="rounded-edge border border-ink px-4 py-2 font-semibold" onClick={retry}>
            Try again
          </button>
        </main>
      </body>
    </html>
  );
}
