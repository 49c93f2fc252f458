import { currentActor } from "@/app/_server/session";
import { neededByCalendar } from "@/lib/proposals/day-sheet/needed-by-calendar";

/** The reader's needed-by dates as a calendar file. */
export async function GET(request: Request): Promise<Response> {
  const actor = await currentActor();
  if (!actor) return new Response("Sign in first.\n", { status: 401 });
  const baseUrl = process.env.NEXTAUTH_URL ?? new URL(request.url).origin;

  return new Response(await neededByCalendar(actor, { baseUrl }), {
    headers: {
      "content-type": "text/calendar; charset=utf-8",
      "content-disposition": 'attachment; filename="leeboard-needed-by.ics"',
      "x-content-type-options": "nosniff",
      "cache-control": "no-store",
    },
  });
}
