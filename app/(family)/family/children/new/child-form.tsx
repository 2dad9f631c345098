"use client";

import { GuidedForm } from "@/components/forms/guided-form";
import { TextField } from "@/components/forms/text-field";
import { addChildSchema } from "@/lib/families/family-schema";
import { whoSees } from "@/lib/families/access-profile";
import { addChildAction } from "../actions";

export function ChildForm({ requestId, back }: { requestId: string; back: string }) {
  return (
    <GuidedForm action={addChildAction} schema={addChildSchema} submit="Add" carry={{ requestId, back }}>
      <TextField name="nameUsed" label="What name does the group use?" hint={`Who sees this: ${whoSees.name}.`} />
      <TextField name="legalName" label="Legal name" hint={`For waivers and emergencies only. Who sees this: ${whoSees.legal}.`} />
      <TextField name="birthDate" label="Date of birth" isShort hint="Year, month and day, such as 2015-03-28." />
    </GuidedForm>
  );
}
