"use client";

import { choicesOf } from "@/components/forms/choice";
import { Choices } from "@/components/forms/choices";
import { FormPart } from "@/components/forms/form-part";
import { TextField } from "@/components/forms/text-field";
import {
  chairMoves,
  guideHolds,
  guideSides,
  guideTimes,
  readingFormats,
  restAfter,
  supportInWords,
  transfers,
  travelTools,
  whoSees,
  type AccessProfile,
} from "@/lib/families/access-profile";
import { supportLevels } from "@/lib/cover/support-level";

/** The questions about a child, in the wording and grouping families see everywhere. */
export function ProfileFields({ nameUsed, profile }: { nameUsed: string; profile: AccessProfile | null }) {
  const one = (value: string | null | undefined) => (value ? [value] : []);
  return (
    <>
      <FormPart title="Getting around" seenBy={whoSees.travel}>
        <Choices name="travel" legend={`How does ${nameUsed} like to get around outdoors?`} pick="any" chosen={profile?.travel ?? []} choices={choicesOf(travelTools)} hint="Choose all that fit." />
        <Choices name="chair" legend="With a wheelchair: how does it move?" pick="one" chosen={one(profile?.chair)} choices={choicesOf(chairMoves)} hint="Skip this without a wheelchair." />
        <Choices name="transfer" legend={`With a wheelchair: can ${nameUsed} move to a vehicle seat?`} pick="one" chosen={one(profile?.transfer)} choices={choicesOf(transfers)} hint="Skip this without a wheelchair." />
        <Choices
          name="restAfter"
          legend="How long before a sit-down is good?"
          pick="one"
          chosen={one(profile?.restAfter)}
          choices={restAfter.map((value) => ({ value, label: value === "not sure" ? "Not sure" : value === "60" ? "60 minutes or more" : `${value} minutes` }))}
        />
      </FormPart>
      <FormPart title="A guide" seenBy={whoSees.guide}>
        <Choices name="guideWhen" legend="When is a guide welcome?" pick="any" chosen={profile?.guideWhen ?? []} choices={choicesOf(guideTimes)} hint="Choose all that fit." />
        <Choices name="guideSide" legend="Which arm of the guide?" pick="one" chosen={one(profile?.guideSide)} choices={choicesOf(guideSides, { left: "The guide's left arm", right: "The guide's right arm" })} />
        <Choices name="guideHold" legend={`Where does ${nameUsed} hold?`} pick="one" chosen={one(profile?.guideHold)} choices={choicesOf(guideHolds)} />
      </FormPart>
      <FormPart title="Somebody alongside" seenBy={whoSees.support}>
        <Choices name="support" legend={`How much help makes a good day for ${nameUsed}?`} pick="one" chosen={one(profile?.support)} choices={choicesOf(supportLevels, supportInWords)} hint="This decides how many adults come. It never decides who is welcome." />
        <TextField
          name="leaderNote"
          label="One thing the leader should do (optional)"
          value={profile?.leaderNote ?? ""}
          hint={`An action, not the reason: for example "shade every 20 minutes". Who sees this: ${whoSees.leaderNote}.`}
        />
      </FormPart>
      <FormPart title="Reading" seenBy={whoSees.reading}>
        <Choices name="reading" legend={`How would ${nameUsed} like printed things?`} pick="one" chosen={one(profile?.reading)} choices={choicesOf(readingFormats)} />
      </FormPart>
      <FormPart title="Pictures and voice" seenBy={whoSees.media}>
        <Choices name="photo" legend={`May we take pictures with ${nameUsed} in them?`} pick="one" chosen={one(profile?.photo)} choices={choicesOf(["yes", "no"])} />
        <Choices name="voice" legend={`May recordings we keep have ${nameUsed}'s voice in them?`} pick="one" chosen={one(profile?.voice)} choices={choicesOf(["yes", "no"])} />
      </FormPart>
      <FormPart title="Whom we call" seenBy={whoSees.contacts} name="contacts">
        {[0, 1].map((index) => (
          <fieldset key={index} className="mt-6">
            <legend className="font-bold text-[1.1rem]">{index === 0 ? "First person" : "Second person (optional)"}</legend>
            <TextField name={`contacts.${index}.name`} label="Name" value={profile?.contacts[index]?.name ?? ""} />
            <TextField name={`contacts.${index}.relationship`} label="Who they are to the child" value={profile?.contacts[index]?.relationship ?? ""} />
            <TextField name={`contacts.${index}.phone`} label="Phone number" type="tel" isShort value={profile?.contacts[index]?.phone ?? ""} />
          </fieldset>
        ))}
      </FormPart>
      <FormPart title="Who may collect" seenBy={whoSees.pickUp} name="pickUp">
        <p className="mt-2">Everybody on this list shows a photo ID on the day.</p>
        {[0, 1, 2].map((index) => (
          <fieldset key={index} className="mt-6">
            <legend className="font-bold text-[1.1rem]">{index === 0 ? "First person" : index === 1 ? "Second person (optional)" : "Third person (optional)"}</legend>
            <TextField name={`pickUp.${index}.name`} label="Full name" value={profile?.pickUp[index]?.name ?? ""} />
            <TextField name={`pickUp.${index}.relationship`} label="Who they are to the child" value={profile?.pickUp[index]?.relationship ?? ""} />
          </fieldset>
        ))}
      </FormPart>
    </>
  );
}
