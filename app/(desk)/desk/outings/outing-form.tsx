"use client";

import { Choices } from "@/components/forms/choices";
import { FormPart } from "@/components/forms/form-part";
import { GuidedForm } from "@/components/forms/guided-form";
import { SelectField } from "@/components/forms/select-field";
import { TextArea } from "@/components/forms/text-area";
import { TextField } from "@/components/forms/text-field";
import { changeOutingSchema, planOutingSchema } from "@/lib/outings/outing-schema";
import { changeOutingAction, planOutingAction } from "./actions";

type Values = Record<
  | "title" | "theme" | "summary" | "siteId" | "day" | "startTime" | "endTime" | "seats" | "youngestAge" | "oldestAge"
  | "suggestedFee" | "policyId" | "meetingText" | "slug" | "edition",
  string
> & { modelIds: string[] };

type Props = {
  sites: { id: string; name: string }[];
  policies: { id: string; name: string }[];
  models: { id: string; title: string; concept: string }[];
  values?: Values | undefined;
  requestId: string;
};

export function OutingForm({ sites, policies, models, values, requestId }: Props) {
  const isNew = values === undefined;
  return (
    <GuidedForm
      action={isNew ? planOutingAction : changeOutingAction}
      schema={isNew ? planOutingSchema : changeOutingSchema}
      submit={isNew ? "Save as a draft" : "Save the changes"}
      carry={isNew ? { requestId } : { slug: values.slug, edition: values.edition }}
    >
      <FormPart title="The day">
        <TextField name="title" label="Title" value={values?.title} />
        <TextField name="theme" label="Sound or theme" value={values?.theme} hint="What you listen for, such as waves that build and break." />
        <TextArea name="summary" label="What the day is like" value={values?.summary} hint="For families: activity, effort, how loud it is, and what is not possible." />
        <SelectField name="siteId" label="Site" value={values?.siteId} empty="Choose a site" choices={sites.map((site) => ({ value: site.id, label: site.name }))} />
        <TextField name="day" label="Date" isShort value={values?.day} hint="Year, month and day, such as 2027-01-09." />
        <TextField name="startTime" label="Starts at" isShort value={values?.startTime} hint="24-hour clock at the site, such as 09:00." />
        <TextField name="endTime" label="Ends at" isShort value={values?.endTime} hint="Such as 12:00." />
      </FormPart>
      <FormPart title="Who can come">
        <TextField name="seats" label="Seats" isShort inputMode="numeric" value={values?.seats} />
        <TextField name="youngestAge" label="Youngest age" isShort inputMode="numeric" value={values?.youngestAge} />
        <TextField name="oldestAge" label="Oldest age" isShort inputMode="numeric" value={values?.oldestAge} />
        <TextField name="suggestedFee" label="Suggested fee, in dollars" isShort inputMode="decimal" value={values?.suggestedFee} hint="0 for none. Families may always choose another amount or a no-fee place." />
        <SelectField name="policyId" label="Cover policy" value={values?.policyId ?? policies[0]?.id ?? ""} empty="Choose a policy" choices={policies.map((policy) => ({ value: policy.id, label: policy.name }))} hint="Which ratios the cover check uses." />
      </FormPart>
      <FormPart title="Where to meet">
        <TextArea
          name="meetingText"
          label="Meeting-point instructions"
          rows={14}
          value={values?.meetingText}
          hint="For families and chaperones. One leg a line, numbered: which way to face, how far, what is underfoot, what tells that you have arrived, and what tells that you have gone too far. Name a person and a phone."
        />
      </FormPart>
      <FormPart title="Teaching models">
        <Choices
          name="modelIds"
          legend="Which models come along?"
          pick="any"
          chosen={values?.modelIds ?? []}
          choices={models.map((model) => ({ value: model.id, label: model.title, hint: model.concept }))}
        />
      </FormPart>
    </GuidedForm>
  );
}
