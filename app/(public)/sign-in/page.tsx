import type { Metadata } from "next";
import Link from "next/link";
import { ActionForm } from "@/components/forms/action-form";
import { TextField } from "@/components/forms/text-field";
import { PageHeading } from "@/components/ui/page-heading";
import { askForLinkAction, signInAction } from "./actions";

export const metadata: Metadata = { title: "Sign in" };

type Props = { searchParams: Promise<{ back?: string }> };

export default async function SignInPage({ searchParams }: Props) {
  const { back = "" } = await searchParams;
  return (
    <>
      <PageHeading title="Sign in" facts={back ? "Sign in, and you go on where you were." : undefined} />
      <ActionForm action={signInAction} submit="Sign in" carry={{ back }}>
        <TextField name="email" label="E-mail address" type="email" autoComplete="username" spellCheck={false} />
        <TextField name="password" label="Password" type="password" autoComplete="current-password" />
      </ActionForm>
      <section aria-labelledby="by-link" className="mt-12">
        <h2 id="by-link" className="pb-1.5 border-b-2 border-edge">
          Or without a password
        </h2>
        <p className="mt-3">We send a link to your address. Open it, and you are signed in: nothing to remember and nothing to copy.</p>
        <ActionForm action={askForLinkAction} submit="Send me a link" look="second" scope="link">
          <TextField name="linkEmail" label="E-mail address for the link" type="email" autoComplete="email" spellCheck={false} />
        </ActionForm>
      </section>
      <section aria-labelledby="new" className="mt-12">
        <h2 id="new" className="pb-1.5 border-b-2 border-edge">
          New here?
        </h2>
        <p className="mt-3">
          <Link href={back ? `/sign-up?back=${encodeURIComponent(back)}` : "/sign-up"}>Make a family account</Link>. Chaperones and staff are invited by mail.
        </p>
      </section>
    </>
  );
}
