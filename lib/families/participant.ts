import type { AccessProfile } from "./access-profile";

export type Participant = {
  id: string;
  householdId: string;
  guardianIds: string[];
  nameUsed: string;
  legalName: string;
  birthDate: string;
  profile: { id: string; version: number; answers: AccessProfile } | null;
};
