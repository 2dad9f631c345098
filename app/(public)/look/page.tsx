import type { Metadata } from "next";
import { ActionForm } from "@/components/forms/action-form";
import { Choices } from "@/components/forms/choices";
import { DoneMessage } from "@/components/forms/done-message";
import { PageHeading } from "@/components/ui/page-heading";
import { currentLook } from "@/lib/web/look";
import { chooseLookAction } from "./actions";

export const metadata: Metadata = { title: "Text size and colours" };

type Props = { searchParams: Promise<{ saved?: string }> };

export default async function LookPage({ searchParams }: Props) {
  const look = await currentLook();
  const { saved } = await searchParams;
  return (
    <>
      <PageHeading title="Text size and colours" facts="Kept on this device. Your browser's own zoom and spacing work as well, on every page." />
      <DoneMessage sentence={saved ? "Saved. Every page looks like this now." : ""} />
      <ActionForm action={chooseLookAction} submit="Use these">
        <Choices
          name="text"
          legend="Text size"
          pick="one"
          chosen={[look.text]}
          choices={[
            { value: "100", label: "Large, as it comes" },
            { value: "125", label: "Larger by a quarter" },
            { value: "150", label: "Half as large again" },
            { value: "200", label: "Twice as large" },
          ]}
        />
        <Choices
          name="theme"
          legend="Colours"
          pick="one"
          chosen={[look.theme]}
          choices={[
            { value: "as the device", label: "As this device is set" },
            { value: "light", label: "Light" },
            { value: "dark", label: "Dark" },
            { value: "contrast", label: "High contrast: white and yellow on black" },
          ]}
        />
      </ActionForm>
    </>
  );
}
