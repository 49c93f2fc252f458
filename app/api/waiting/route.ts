import { productsToEstablish } from "@/app/_server/products-to-establish";
import { answerRead } from "@/app/_server/route-problem";
import { waitingCount } from "@/lib/proposals/day-sheet/waiting-count";

/** How much waits for the reader: for the head of every page. */
export function GET(): Promise<Response> {
  return answerRead(async (actor) => {
    const [waiting, toEstablish] = await Promise.all([waitingCount(actor), productsToEstablish(actor)]);

    return { count: waiting + toEstablish.length };
  });
}
