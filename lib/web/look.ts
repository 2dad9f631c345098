import { cookies } from "next/headers";

export const themes = ["as the device", "light", "dark", "contrast"] as const;
export type Theme = (typeof themes)[number];
export const textSizes = ["100", "125", "150", "200"] as const;
export type TextSize = (typeof textSizes)[number];

export const lookCookie = "dunlin_look";

/** How this device likes to read: kept in a cookie, so the first byte already comes in the right colours. */
export async function currentLook(): Promise<{ theme: Theme; text: TextSize }> {
  const [theme, text] = ((await cookies()).get(lookCookie)?.value ?? "").split("/");
  return {
    theme: themes.find((one) => one === theme?.replaceAll("-", " ")) ?? "as the device",
    text: textSizes.find((one) => one === text) ?? "100",
  };
}
