import type { InputOf, MethodInput } from "../document/schema";
import type { MethodName } from "./method-name";
import type { StreamState } from "./stream-state";

/** A function of one method's input as a function of any input; another method's input is a fault of the program. */
export function ofMethod<M extends MethodName, Result>(
  name: M,
  use: (input: InputOf<M>, stream: StreamState) => Result,
): (input: MethodInput, stream: StreamState) => Result {
  return (input, stream) => {
    if (!isOfMethod(input, name)) throw new RangeError(`input of ${input.method} given to ${name}`);
    return use(input, stream);
  };
}

function isOfMethod<M extends MethodName>(input: MethodInput, name: M): input is InputOf<M> {
  return input.method === name;
}
