"use client";

import { GuidedForm } from "@/components/forms/guided-form";
import { ProfileFields } from "@/components/registrations/profile-fields";
import type { AccessProfile } from "@/lib/families/access-profile";
import { writeProfileSchema } from "@/lib/families/family-schema";
import { writeProfileAction } from "../actions";

export function ProfileForm({ participantId, nameUsed, profile }: { participantId: string; nameUsed: string; profile: AccessProfile | null }) {
  return (
    <GuidedForm action={writeProfileAction} schema={writeProfileSchema} submit="Save" carry={{ participantId }}>
      <ProfileFields nameUsed={nameUsed} profile={profile} />
    </GuidedForm>
  );
}
