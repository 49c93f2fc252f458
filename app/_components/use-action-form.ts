"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { useState } from "react";
import { type DefaultValues, type FieldPath, type FieldValues, get, useForm } from "react-hook-form";
import type { z } from "zod";

import type { ActionResult } from "../_server/action-result";
import { answerOf } from "./answer-of";

interface ActionFormOptions<Input extends FieldValues, Output, Value> {
  schema: z.ZodType<Output, Input>;
  action: (input: Input) => Promise<ActionResult<Value>>;
  defaults: DefaultValues<Input>;
  /** After success: where to go, or what to say. */
  onDone: (value: Value) => void;
}

/** One form, one schema, one action: faults of either side stand at their fields, any other refusal below them. */
export function useActionForm<Input extends FieldValues, Output, Value>(
  options: ActionFormOptions<Input, Output, Value>,
) {
  const { schema, action, defaults, onDone } = options;
  const [refusal, setRefusal] = useState<string | null>(null);
  const form = useForm<Input, unknown, Output>({ resolver: zodResolver(schema), defaultValues: defaults });

  // The action parses again: what is sent is what was typed, not what this side made of it.
  const submit = form.handleSubmit(async () => {
    setRefusal(null);
    const result = await answerOf(action(form.getValues()));
    if (result.ok) return onDone(result.value);

    setRefusal(result.sentence);
    for (const { path, sentence } of result.faults) {
      form.setError(path as FieldPath<Input>, { message: sentence });
    }
  });

  return {
    register: form.register,
    watch: form.watch,
    reset: () => form.reset(),
    submit,
    refusal,
    busy: form.formState.isSubmitting,
    errorAt: (path: FieldPath<Input>): string | undefined => {
      const message: unknown = get(form.formState.errors, `${path}.message`);

      return typeof message === "string" ? message : undefined;
    },
  };
}
