import type { Metadata } from "next";
import { ActionForm } from "@/components/forms/action-form";
import { TextField } from "@/components/forms/text-field";
import { PageHeading } from "@/components/ui/page-heading";
import { signUpAction } from "./actions";

export const metadata: Metadata = { title: "Make a family account" };

type Props = { searchParams: Promise<{ back?: string }> };

export default async function SignUpPage({ searchParams }: Props) {
  const { back = "" } = await searchParams;
  return (
    <>
      <PageHeading title="Make a family account" facts="For a parent or guardian. Children have no accounts. We can do all of this by phone if you prefer." />
      <ActionForm action={signUpAction} submit="Make the account" carry={{ back }}>
        <TextField name="name" label="Your name" autoComplete="name" />
        <TextField name="email" label="E-mail address" type="email" autoComplete="email" spellCheck={false} />
        <TextField name="phone" label="Phone number (optional)" type="tel" autoComplete="tel" hint="With area code. For the days of outings." />
        <TextField name="password" label="Choose a password" type="password" autoComplete="new-password" hint="At least 10 characters. Several words in a row are easy to keep." />
      </ActionForm>
    </>
  );
}
