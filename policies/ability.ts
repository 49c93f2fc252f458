import { AbilityBuilder, createMongoAbility, subject, type ForcedSubject, type MongoAbility } from "@casl/ability";
import type { Actor } from "@/lib/vocabulary/actor";
import type { Role } from "@/lib/vocabulary/roles";
import type { Question } from "@/policies/questions";

type FactsOf<Q> = Q extends { on: infer Name extends string } ? Omit<Q, "on" | "action"> & ForcedSubject<Name> : never;
type TupleOf<Q> = Q extends Question ? [Q["action"], Q["on"] | FactsOf<Q>] : never;
export type AppAbility = MongoAbility<TupleOf<Question>>;
type Can = AbilityBuilder<AppAbility>["can"];

/** Everything a person may do. Who is not named here may not: there are no rules that forbid. */
export function abilityFor(actor: Actor): AppAbility {
  const { can, build } = new AbilityBuilder<AppAbility>(createMongoAbility);
  can("keep_preferences", "Account", { userId: actor.userId });
  if (actor.isAdministrator) allowAdministrator(can);
  for (const { productId, role } of actor.memberships) {
    allowMember(can, actor, productId);
    BY_ROLE[role](can, actor, productId);
  }
  return build();
}

/** Does the ability cover this very thing? Never the question whether anything at all is covered. */
export function covers(ability: AppAbility, question: Question): boolean {
  switch (question.on) {
    case "Installation":
      return ability.can(question.action, subject("Installation", {}));
    case "Account":
      return ability.can(question.action, subject("Account", { userId: question.userId }));
    case "Product":
      return ability.can(question.action, subject("Product", { productId: question.productId }));
    case "Line": {
      const { productId, kind, ownerBefore, ownerAfter } = question;
      return ability.can(question.action, subject("Line", { productId, kind, ownerBefore, ownerAfter }));
    }
    case "Transfer": {
      const { productId, giverOwner, receiverOwner } = question;
      return ability.can(question.action, subject("Transfer", { productId, giverOwner, receiverOwner }));
    }
    case "Draft": {
      const { productId, proposerId, isEditor } = question;
      return ability.can(question.action, subject("Draft", { productId, proposerId, isEditor }));
    }
    case "Proposal": {
      const { productId, proposerId, isEditor } = question;
      return ability.can(question.action, subject("Proposal", { productId, proposerId, isEditor }));
    }
    case "Round": {
      const { productId, asDeputy } = question;
      return ability.can(question.action, subject("Round", { productId, asDeputy }));
    }
    case "Signature": {
      const { productId, signerId } = question;
      return ability.can(question.action, subject("Signature", { productId, signerId }));
    }
    case "Deputyship": {
      const { productId, holderId } = question;
      return ability.can(question.action, subject("Deputyship", { productId, holderId }));
    }
    case "File": {
      const { productId, addedById } = question;
      return ability.can(question.action, subject("File", { productId, addedById }));
    }
    case "Remark": {
      const { productId, authorId, hasPart } = question;
      return ability.can(question.action, subject("Remark", { productId, authorId, hasPart }));
    }
  }
}

/** An administrator keeps accounts, products and roles; budgets and signatures come with a role only. */
function allowAdministrator(can: Can): void {
  can(["create_product", "give_role", "end_role"], "Installation");
  can(["create_account", "deactivate_account", "read_accounts", "read_house_history"], "Installation");
  can("see", "Product");
}

function allowMember(can: Can, actor: Actor, productId: number): void {
  can(["see", "read_budget", "read_history", "export"], "Product", { productId });
  can("read", "Proposal", { productId });
}

const BY_ROLE: Record<Role, (can: Can, actor: Actor, productId: number) => void> = {
  component_owner: (can, actor, productId) => {
    allowProposing(can, actor, productId);
    can(["revise", "retire", "reinstate"], "Line", { productId, kind: "item", ownerBefore: actor.userId });
    can("add", "Line", { productId, kind: "item", ownerAfter: actor.userId });
    can("ask", "Transfer", { productId, giverOwner: actor.userId });
    can("ask", "Transfer", { productId, receiverOwner: actor.userId });
    allowTakingPart(can, actor, productId);
  },
  reviewer: (can, actor, productId) => {
    can("name_deputy", "Product", { productId });
    can("sign_as_reviewer", "Round", { productId });
    allowTakingPart(can, actor, productId);
  },
  program_manager: (can, actor, productId) => {
    allowProposing(can, actor, productId);
    can(["add", "revise", "retire", "reinstate"], "Line", { productId });
    can("ask", "Transfer", { productId });
    can("withdraw", "Proposal", { productId });
    can(["establish", "make_baseline", "assign_reviewer", "name_deputy", "read_lookings"], "Product", { productId });
    can(["sign_as_program_manager", "disapprove"], "Round", { productId });
    can("settle", "Remark", { productId, hasPart: false });
    can("void", "File", { productId });
    allowTakingPart(can, actor, productId);
  },
  // Reads with every member's rights and the house's history besides; changes nothing, drafts excepted from view.
  auditor: (can, _actor, productId) => {
    can("read_house_history", "Installation");
    can("read_lookings", "Product", { productId });
  },
};

function allowProposing(can: Can, actor: Actor, productId: number): void {
  const own = { productId, proposerId: actor.userId };
  const shared = { productId, isEditor: true };
  can("start_draft", "Product", { productId });
  can(["edit", "share", "propose"], "Draft", own);
  can(["edit", "propose"], "Draft", shared);
  can(["edit", "propose", "carry_forward"], "Proposal", own);
  can(["edit", "propose", "carry_forward"], "Proposal", shared);
}

/** What every member may but an auditor. Who lost the role that a proposal needs can still read and withdraw it. */
function allowTakingPart(can: Can, actor: Actor, productId: number): void {
  const own = { productId, proposerId: actor.userId };
  can(["remark", "object", "run_monte_carlo", "add_file"], "Product", { productId });
  can("void", "File", { productId, addedById: actor.userId });
  can("settle", "Remark", { productId, authorId: actor.userId });
  can(["read", "withdraw"], "Draft", own);
  can("read", "Draft", { productId, isEditor: true });
  can("withdraw", "Proposal", own);
  can(["sign_as_reviewer", "sign_as_program_manager", "disapprove"], "Round", { productId, asDeputy: true });
  can("take_back", "Signature", { productId, signerId: actor.userId });
  can("end", "Deputyship", { productId, holderId: actor.userId });
}
