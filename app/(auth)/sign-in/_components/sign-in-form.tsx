"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import type { Route } from "next";
import { signIn } from "next-auth/react";
import { useState } from "react";
import { useForm } from "react-hook-form";

import { Button } from "@/app/_components/button";
import { loadAnew } from "@/app/_components/load-anew";
import { Notice } from "@/app/_components/notice";
import { TextField } from "@/app/_components/text-field";
import { useHydrated } from "@/app/_components/use-hydrated";
import { SignInInput } from "@/lib/accounts/schema";

const REFUSALS: Record<string, string> = {
  CredentialsSignin: "E-mail address and password do not belong together. Check both and try again.",
  too_many_attempts: "Too many attempts. Wait a quarter of an hour, then try again.",
};

export function SignInForm({ destination }: { destination: Route }) {
  const [refusal, setRefusal] = useState<string | null>(null);
  const { register, handleSubmit, formState } = useForm<SignInInput>({ resolver: zodResolver(SignInInput) });
  const { errors, isSubmitting } = formState;
  // Sent before the page is alive, the form would only load itself again.
  const hydrated = useHydrated();

  async function submit(input: SignInInput) {
    setRefusal(null);
    const answer = await signIn("credentials", { ...input, redirect: false });
    if (answer?.ok && !answer.error) {
      loadAnew(destination);
      return;
    }
    setRefusal(REFUSALS[answer?.error ?? ""] ?? "Signing in did not work. Try again in a moment.");
  }

  return (
    <form noValidate method="post" onSubmit={handleSubmit(submit)} className="space-y-4">
      <TextField
        label="E-mail"
        type="email"
        autoComplete="username"
        error={errors.email?.message}
        {...register("email")}
      />
      <TextField
        label="Password"
        type="password"
        autoComplete="current-password"
        error={errors.password?.message}
        {...register("password")}
      />
      {refusal ? <Notice kind="refusal">{refusal}</Notice> : null}
      <Button type="submit" kind="primary" busy={isSubmitting} disabled={!hydrated}>
        {isSubmitting ? "One moment…" : "Sign in"}
      </Button>
    </form>
  );
}
