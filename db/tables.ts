/** What each table's rows are, as SQLite gives them: instants and days as text, booleans as 0 or 1. */

export type PersonRow = {
  id: string;
  email: string;
  name: string;
  phone: string | null;
  password_hash: string | null;
  email_confirmed_at: string | null;
  reading_format: string;
  text_size_pt: number;
  created_at: string;
};
export type PersonRoleRow = { person_id: string; role: "guardian" | "chaperone" | "leader" | "coordinator" | "admin" };
export type SessionRow = { id: string; user_id: string; expires_at: number };
export type MailLinkRow = {
  secret_hash: string;
  purpose: "confirm-email" | "sign-in" | "invitation" | "answer";
  person_id: string;
  about_id: string | null;
  carries: string | null;
  made_at: string;
  expires_at: string;
  used_at: string | null;
};
export type SignInAttemptRow = { id?: number; email: string; at: string };
export type HouseholdRow = { id: string; created_at: string };
export type HouseholdGuardianRow = { household_id: string; person_id: string };
export type ParticipantRow = {
  id: string;
  household_id: string;
  name_used: string;
  legal_name: string;
  birth_date: string;
  created_at: string;
  request_id: string;
};
export type AccessProfileRow = {
  id: string;
  participant_id: string;
  version: number;
  answers: string;
  written_by: string;
  written_at: string;
};
export type SiteRow = {
  id: string;
  slug: string;
  name: string;
  land_manager: string;
  zone: string;
  ground: string;
  meeting_point: string;
};
export type PolicyRow = { id: string; key: string; version: number; body: string; created_at: string };
export type OutingRow = {
  id: string;
  slug: string;
  title: string;
  theme: string;
  summary: string;
  site_id: string;
  starts_at: string;
  ends_at: string;
  youngest_age: number;
  oldest_age: number;
  suggested_fee_cents: number;
  currency: string;
  policy_id: string;
  meeting_text: string;
  state: "draft" | "open" | "closed" | "called off" | "done";
  called_off_because: string | null;
  edition: number;
  request_id: string;
  created_at: string;
  updated_at: string;
};
export type RegistrationRow = {
  id: string;
  outing_id: string;
  participant_id: string;
  registered_by: string;
  state: "held" | "waiting" | "confirmed" | "withdrawn" | "turned away";
  hold_ends_at: string | null;
  waiting_since: string | null;
  confirmed_at: string | null;
  profile_id: string | null;
  guardian_stays: "stays" | "helps" | "drops off" | null;
  this_time: string | null;
  created_at: string;
  updated_at: string;
};
export type SeatRow = { outing_id: string; number: number; registration_id: string | null };
export type WaiverTextRow = {
  id: string;
  version: number;
  title: string;
  body: string;
  sha256: string;
  in_force_from: string;
};
export type SignatureRow = {
  id: string;
  registration_id: string;
  waiver_text_id: string;
  text_sha256: string;
  signed_by: string;
  typed_name: string;
  typed_date: string;
  signed_at: string;
};
export type PaymentRow = {
  id: string;
  registration_id: string;
  kind: "checkout" | "no-fee";
  amount_cents: number;
  currency: string;
  state: "pending" | "settled" | "abandoned" | "returned";
  checkout_session_id: string | null;
  checkout_url: string | null;
  payment_intent_id: string | null;
  created_at: string;
  settled_at: string | null;
};
export type PaymentEventRow = { id: string; type: string; received_at: string };
export type HelperRecordRow = {
  person_id: string;
  is_adult: number;
  cleared_until: string | null;
  guides_left: number;
  guides_right: number;
  pushes_chair: number;
  first_aid: number;
  drives: number;
  updated_at: string;
};
export type HelperAnswerRow = {
  id: string;
  outing_id: string;
  person_id: string;
  task: "chaperone" | "leader";
  state: "asked" | "yes" | "maybe" | "no";
  asked_at: string;
  answered_at: string | null;
};
export type PairingRow = { registration_id: string; person_id: string };
export type MessageRow = {
  id: string;
  kind: string;
  facts: string;
  to_person_id: string | null;
  to_address: string;
  outing_id: string | null;
  once_key: string | null;
  state: "queued" | "sending" | "sent" | "failed" | "cancelled";
  attempts: number;
  next_attempt_at: string;
  last_problem: string | null;
  subject: string | null;
  text_body: string | null;
  created_at: string;
  sent_at: string | null;
};
export type FileRow = { sha256: string; media_type: string; bytes: number; stored_at: string };
export type TeachingModelRow = {
  id: string;
  slug: string;
  title: string;
  concept: string;
  facts: string;
  picture_sha256: string;
  audio_sha256: string;
  printable_sha256: string;
  position: number;
};
export type OutingModelRow = { outing_id: string; model_id: string };
export type PaperRow = {
  id: string;
  outing_id: string;
  kind: "roster";
  form: "standard" | "large print";
  text_size_pt: number;
  version: number;
  facts_sha256: string;
  facts: string;
  printed_by: string;
  printed_at: string;
};
export type AccessLogRow = { id?: number; person_id: string; what: string; about_id: string; at: string };

declare module "knex/types/tables" {
  interface Tables {
    people: PersonRow;
    person_roles: PersonRoleRow;
    sessions: SessionRow;
    mail_links: MailLinkRow;
    sign_in_attempts: SignInAttemptRow;
    households: HouseholdRow;
    household_guardians: HouseholdGuardianRow;
    participants: ParticipantRow;
    access_profiles: AccessProfileRow;
    sites: SiteRow;
    policies: PolicyRow;
    outings: OutingRow;
    registrations: RegistrationRow;
    seats: SeatRow;
    waiver_texts: WaiverTextRow;
    signatures: SignatureRow;
    payments: PaymentRow;
    payment_events: PaymentEventRow;
    helper_records: HelperRecordRow;
    helper_answers: HelperAnswerRow;
    pairings: PairingRow;
    messages: MessageRow;
    files: FileRow;
    teaching_models: TeachingModelRow;
    outing_models: OutingModelRow;
    papers: PaperRow;
    access_log: AccessLogRow;
  }
}
