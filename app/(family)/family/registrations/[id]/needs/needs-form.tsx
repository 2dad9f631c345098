"use client";

import { Choices } from "@/components/forms/choices";
import { FormPart } from "@/components/forms/form-part";
import { GuidedForm } from "@/components/forms/guided-form";
import { TextArea } from "@/components/forms/text-area";
import { ProfileFields } from "@/components/registrations/profile-fields";
import type { AccessProfile } from "@/lib/families/access-profile";
import type { GuardianPlan } from "@/lib/registrations/registration";
import { confirmNeedsSchema } from "@/lib/registrations/registration-schema";
import { confirmNeedsAction } from "../actions";

type Props = { registrationId: string; nameUsed: string; profile: AccessProfile | null; guardianStays: GuardianPlan | null; thisTime: string };

export function NeedsForm({ registrationId, nameUsed, profile, guardianStays, thisTime }: Props) {
  return (
    <GuidedForm action={confirmNeedsAction} schema={confirmNeedsSchema} submit={profile ? "Still right: send this" : "Send this"} carry={{ registrationId }}>
      <FormPart title="This outing" seenBy="the coordinator">
        <Choices
          name="guardianStays"
          legend="What will you do on the day?"
          pick="one"
          chosen={guardianStays ? [guardianStays] : []}
          choices={[
            { value: "drops off", label: `Bring ${nameUsed} and come back` },
            { value: "stays", label: `Stay with ${nameUsed}` },
            { value: "helps", label: "Stay and help the group", hint: "Counts for the group only with a clearance; we tell you how to get one." },
          ]}
        />
        <TextArea name="thisTime" label="Is anything different this time? (optional)" value={thisTime} hint="For this outing only. No medical detail here, please: call us about it." />
      </FormPart>
      <ProfileFields nameUsed={nameUsed} profile={profile} />
    </GuidedForm>
  );
}
