import type { Knex } from "knex";

/**
 * Instants are ISO 8601 UTC text, days are YYYY-MM-DD, money is integer cents, ids are opaque text.
 * What must never be is a CHECK or a unique key here, not a habit in the code.
 */
export async function up(knex: Knex): Promise<void> {
  await people(knex);
  await families(knex);
  await outings(knex);
  await registrations(knex);
  await papersAndMoney(knex);
  await adults(knex);
  await messages(knex);
  await teachingModels(knex);
  await papers(knex);
}

async function people(knex: Knex) {
  await knex.schema.createTable("people", (t) => {
    t.text("id").primary();
    t.text("email").notNullable().unique();
    t.text("name").notNullable();
    t.text("phone");
    t.text("password_hash");
    t.text("email_confirmed_at");
    t.text("reading_format").notNullable().defaultTo("print");
    t.integer("text_size_pt").notNullable().defaultTo(18);
    t.text("created_at").notNullable();
    t.check("email = lower(email)");
    t.check("text_size_pt between 12 and 48");
  });
  await knex.schema.createTable("person_roles", (t) => {
    t.text("person_id").notNullable().references("people.id").onDelete("CASCADE");
    t.text("role").notNullable().checkIn(["guardian", "chaperone", "leader", "coordinator", "admin"]);
    t.primary(["person_id", "role"]);
  });
  await knex.schema.createTable("sessions", (t) => {
    t.text("id").primary();
    t.text("user_id").notNullable().references("people.id").onDelete("CASCADE");
    t.integer("expires_at").notNullable();
  });
  // A link in a mail. The secret itself is nowhere; a used or late one is dead.
  await knex.schema.createTable("mail_links", (t) => {
    t.text("secret_hash").primary();
    t.text("purpose").notNullable().checkIn(["confirm-email", "sign-in", "invitation", "answer"]);
    t.text("person_id").notNullable().references("people.id").onDelete("CASCADE");
    t.text("about_id");
    // What takes effect when the link is followed, such as a new account's password hash.
    t.text("carries");
    t.text("made_at").notNullable();
    t.text("expires_at").notNullable();
    t.text("used_at");
    t.index(["person_id", "purpose"]);
  });
  await knex.schema.createTable("sign_in_attempts", (t) => {
    t.increments("id");
    t.text("email").notNullable();
    t.text("at").notNullable();
    t.index(["email", "at"]);
  });
}

async function families(knex: Knex) {
  await knex.schema.createTable("households", (t) => {
    t.text("id").primary();
    t.text("created_at").notNullable();
  });
  await knex.schema.createTable("household_guardians", (t) => {
    t.text("household_id").notNullable().references("households.id").onDelete("CASCADE");
    t.text("person_id").notNullable().references("people.id").onDelete("CASCADE");
    t.primary(["household_id", "person_id"]);
  });
  await knex.schema.createTable("participants", (t) => {
    t.text("id").primary();
    t.text("household_id").notNullable().references("households.id");
    t.text("name_used").notNullable();
    t.text("legal_name").notNullable();
    t.text("birth_date").notNullable();
    t.text("created_at").notNullable();
    t.text("request_id").notNullable().unique();
    t.check("birth_date glob '[0-9][0-9][0-9][0-9]-[0-9][0-9]-[0-9][0-9]'");
  });
  // A profile is never changed, only followed by the next version: a registration points at the one it relied on.
  await knex.schema.createTable("access_profiles", (t) => {
    t.text("id").primary();
    t.text("participant_id").notNullable().references("participants.id").onDelete("CASCADE");
    t.integer("version").notNullable();
    t.text("answers").notNullable();
    t.text("written_by").notNullable().references("people.id");
    t.text("written_at").notNullable();
    t.unique(["participant_id", "version"]);
    t.check("json_valid(answers)");
  });
}

async function outings(knex: Knex) {
  await knex.schema.createTable("sites", (t) => {
    t.text("id").primary();
    t.text("slug").notNullable().unique();
    t.text("name").notNullable();
    t.text("land_manager").notNullable();
    t.text("zone").notNullable();
    t.text("ground").notNullable();
    t.text("meeting_point").notNullable();
  });
  await knex.schema.createTable("policies", (t) => {
    t.text("id").primary();
    t.text("key").notNullable();
    t.integer("version").notNullable();
    t.text("body").notNullable();
    t.text("created_at").notNullable();
    t.unique(["key", "version"]);
    t.check("json_valid(body)");
  });
  await knex.schema.createTable("outings", (t) => {
    t.text("id").primary();
    t.text("slug").notNullable().unique();
    t.text("title").notNullable();
    t.text("theme").notNullable();
    t.text("summary").notNullable();
    t.text("site_id").notNullable().references("sites.id");
    t.text("starts_at").notNullable();
    t.text("ends_at").notNullable();
    t.integer("youngest_age").notNullable();
    t.integer("oldest_age").notNullable();
    t.integer("suggested_fee_cents").notNullable();
    t.text("currency").notNullable().defaultTo("usd");
    t.text("policy_id").notNullable().references("policies.id");
    t.text("meeting_text").notNullable();
    t.text("state").notNullable().checkIn(["draft", "open", "closed", "called off", "done"]);
    t.text("called_off_because");
    t.integer("edition").notNullable().defaultTo(1);
    t.text("request_id").notNullable().unique();
    t.text("created_at").notNullable();
    t.text("updated_at").notNullable();
    t.index(["state", "starts_at"]);
    t.check("starts_at < ends_at");
    t.check("youngest_age between 0 and oldest_age");
    t.check("suggested_fee_cents >= 0");
  });
}

async function registrations(knex: Knex) {
  await knex.schema.createTable("registrations", (t) => {
    t.text("id").primary();
    t.text("outing_id").notNullable().references("outings.id");
    t.text("participant_id").notNullable().references("participants.id");
    t.text("registered_by").notNullable().references("people.id");
    t.text("state").notNullable().checkIn(["held", "waiting", "confirmed", "withdrawn", "turned away"]);
    t.text("hold_ends_at");
    t.text("waiting_since");
    t.text("confirmed_at");
    t.text("profile_id").references("access_profiles.id");
    t.text("guardian_stays").checkIn(["stays", "helps", "drops off"]);
    t.text("this_time");
    t.text("created_at").notNullable();
    t.text("updated_at").notNullable();
    t.check("(state = 'held') = (hold_ends_at is not null)");
    t.check("(state = 'waiting') = (waiting_since is not null)");
    t.index(["outing_id", "state"]);
  });
  await knex.raw(
    `create unique index one_live_registration on registrations (outing_id, participant_id)
     where state in ('held', 'waiting', 'confirmed')`,
  );
  // A seat is a row with one holder, so a seat cannot be sold twice. Its number is the count-off number.
  await knex.schema.createTable("seats", (t) => {
    t.text("outing_id").notNullable().references("outings.id").onDelete("CASCADE");
    t.integer("number").notNullable();
    t.text("registration_id").unique().references("registrations.id");
    t.primary(["outing_id", "number"]);
    t.check("number >= 1");
  });
}

async function papersAndMoney(knex: Knex) {
  await knex.schema.createTable("waiver_texts", (t) => {
    t.text("id").primary();
    t.integer("version").notNullable().unique();
    t.text("title").notNullable();
    t.text("body").notNullable();
    t.text("sha256").notNullable();
    t.text("in_force_from").notNullable();
  });
  await knex.schema.createTable("signatures", (t) => {
    t.text("id").primary();
    t.text("registration_id").notNullable().references("registrations.id");
    t.text("waiver_text_id").notNullable().references("waiver_texts.id");
    t.unique(["registration_id", "waiver_text_id"]);
    t.text("text_sha256").notNullable();
    t.text("signed_by").notNullable().references("people.id");
    t.text("typed_name").notNullable();
    t.text("typed_date").notNullable();
    t.text("signed_at").notNullable();
  });
  await knex.schema.createTable("payments", (t) => {
    t.text("id").primary();
    t.text("registration_id").notNullable().references("registrations.id");
    t.text("kind").notNullable().checkIn(["checkout", "no-fee"]);
    t.integer("amount_cents").notNullable();
    t.text("currency").notNullable();
    t.text("state").notNullable().checkIn(["pending", "settled", "abandoned", "returned"]);
    t.text("checkout_session_id").unique();
    t.text("checkout_url");
    t.text("payment_intent_id");
    t.text("created_at").notNullable();
    t.text("settled_at");
    t.check("(kind = 'no-fee') = (amount_cents = 0)");
    t.check("amount_cents >= 0");
  });
  await knex.raw("create unique index one_settled_payment on payments (registration_id) where state = 'settled'");
  await knex.raw("create unique index one_pending_payment on payments (registration_id) where state = 'pending'");
  await knex.schema.createTable("payment_events", (t) => {
    t.text("id").primary();
    t.text("type").notNullable();
    t.text("received_at").notNullable();
  });
}

async function adults(knex: Knex) {
  await knex.schema.createTable("helper_records", (t) => {
    t.text("person_id").primary().references("people.id").onDelete("CASCADE");
    t.boolean("is_adult").notNullable().defaultTo(false);
    t.text("cleared_until");
    t.boolean("guides_left").notNullable().defaultTo(false);
    t.boolean("guides_right").notNullable().defaultTo(false);
    t.boolean("pushes_chair").notNullable().defaultTo(false);
    t.boolean("first_aid").notNullable().defaultTo(false);
    t.boolean("drives").notNullable().defaultTo(false);
    t.text("updated_at").notNullable();
  });
  await knex.schema.createTable("helper_answers", (t) => {
    t.text("id").primary();
    t.text("outing_id").notNullable().references("outings.id");
    t.text("person_id").notNullable().references("people.id");
    t.text("task").notNullable().checkIn(["chaperone", "leader"]);
    t.text("state").notNullable().checkIn(["asked", "yes", "maybe", "no"]);
    t.text("asked_at").notNullable();
    t.text("answered_at");
    t.unique(["outing_id", "person_id"]);
  });
  await knex.schema.createTable("pairings", (t) => {
    t.text("registration_id").primary().references("registrations.id").onDelete("CASCADE");
    t.text("person_id").notNullable().references("people.id");
  });
}

async function messages(knex: Knex) {
  await knex.schema.createTable("messages", (t) => {
    t.text("id").primary();
    t.text("kind").notNullable();
    t.text("facts").notNullable();
    t.text("to_person_id").references("people.id");
    t.text("to_address").notNullable();
    t.text("outing_id").references("outings.id");
    t.text("once_key").unique();
    t.text("state").notNullable().checkIn(["queued", "sending", "sent", "failed", "cancelled"]);
    t.integer("attempts").notNullable().defaultTo(0);
    t.text("next_attempt_at").notNullable();
    t.text("last_problem");
    t.text("subject");
    t.text("text_body");
    t.text("created_at").notNullable();
    t.text("sent_at");
    t.index(["state", "next_attempt_at"]);
    t.check("json_valid(facts)");
  });
}

async function teachingModels(knex: Knex) {
  await knex.schema.createTable("files", (t) => {
    t.text("sha256").primary();
    t.text("media_type").notNullable();
    t.integer("bytes").notNullable();
    t.text("stored_at").notNullable();
  });
  await knex.schema.createTable("teaching_models", (t) => {
    t.text("id").primary();
    t.text("slug").notNullable().unique();
    t.text("title").notNullable();
    t.text("concept").notNullable();
    t.text("facts").notNullable();
    t.text("picture_sha256").notNullable().references("files.sha256");
    t.text("audio_sha256").notNullable().references("files.sha256");
    t.text("printable_sha256").notNullable().references("files.sha256");
    t.integer("position").notNullable();
    t.check("json_valid(facts)");
  });
  await knex.schema.createTable("outing_models", (t) => {
    t.text("outing_id").notNullable().references("outings.id").onDelete("CASCADE");
    t.text("model_id").notNullable().references("teaching_models.id");
    t.primary(["outing_id", "model_id"]);
  });
}

async function papers(knex: Knex) {
  await knex.schema.createTable("papers", (t) => {
    t.text("id").primary();
    t.text("outing_id").notNullable().references("outings.id");
    t.text("kind").notNullable().checkIn(["roster"]);
    t.text("form").notNullable().checkIn(["standard", "large print"]);
    t.integer("text_size_pt").notNullable();
    t.integer("version").notNullable();
    t.text("facts_sha256").notNullable();
    t.text("facts").notNullable();
    t.text("printed_by").notNullable().references("people.id");
    t.text("printed_at").notNullable();
    t.unique(["outing_id", "kind", "version", "form", "text_size_pt"]);
    t.check("json_valid(facts)");
  });
  await knex.schema.createTable("access_log", (t) => {
    t.increments("id");
    t.text("person_id").notNullable().references("people.id");
    t.text("what").notNullable();
    t.text("about_id").notNullable();
    t.text("at").notNullable();
  });
}

export async function down(knex: Knex): Promise<void> {
  const tables = [
    "access_log", "papers", "outing_models", "teaching_models", "files", "messages", "pairings", "helper_answers",
    "helper_records", "payment_events", "payments", "signatures", "waiver_texts", "seats", "registrations",
    "outings", "policies", "sites", "access_profiles", "participants", "household_guardians", "households",
    "sign_in_attempts", "mail_links", "sessions", "person_roles", "people",
  ];
  for (const table of tables) await knex.schema.dropTable(table);
}
