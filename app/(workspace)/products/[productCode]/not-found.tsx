import { MessageSheet } from "@/app/_components/message-sheet";

export default function NotFound() {
  return (
    <MessageSheet title="This product has no such sheet" reference="not found">
      <p>
        The number of an item, an operating point, an issue or a proposal in the address may be mistyped, or it came
        with a later issue. The sheets of the product are listed beside this.
      </p>
    </MessageSheet>
  );
}
