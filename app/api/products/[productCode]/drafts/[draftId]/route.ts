import { answerWrite } from "@/app/_server/route-problem";
import { saveDraft } from "@/lib/proposals/drafting/save-draft";
import { SaveDraftInput } from "@/lib/proposals/schema";

type Context = RouteContext<"/api/products/[productCode]/drafts/[draftId]">;

/** Saves a draft as it is typed: a handler and no action, since a client's actions wait for one another. */
export async function PUT(request: Request, { params }: Context): Promise<Response> {
  const draftId = Number((await params).draftId);
  const schema = SaveDraftInput.refine(({ proposalId }) => proposalId === draftId, {
    path: ["proposalId"],
    error: "This is another draft than the address names.",
  });

  return answerWrite(request, schema, saveDraft);
}
