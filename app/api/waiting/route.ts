import { productsToEstablish } from "@/app/_server/products-to-establish";
import { answerRead } from "@/app/_server/route-problem";
import { daySheet } from "@/lib/proposals/day-sheet";

/** How much waits for the reader: for the head of every page. */
export function GET(): Promise<Response> {
  return answerRead(async (actor) => {
    const [{ waitsForMe }, toEstablish] = await Promise.all([daySheet(actor), productsToEstablish(actor)]);

    return { count: waitsForMe.length + toEstablish.length };
  });
}
