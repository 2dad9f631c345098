import type { MessageFacts } from "@/lib/messages/message";
import { link, paragraph, type Draft } from "./letter-parts";

export function confirmEmail({ name, link: href }: MessageFacts["confirm-email"]): Draft {
  return {
    subject: "Confirm your e-mail to finish your account",
    parts: [
      paragraph(`Hello ${name},`),
      paragraph("somebody, we hope you, made a family account with this address. Open the link to say that the address is yours. It works for three days."),
      link("Confirm my e-mail", href),
      paragraph("If it was not you, do nothing: without the link the account stays shut."),
    ],
  };
}

export function alreadyRegistered({ name, link: href }: MessageFacts["already-registered"]): Draft {
  return {
    subject: "You have an account already",
    parts: [
      paragraph(`Hello ${name},`),
      paragraph("somebody, we think you, tried to make a new account with this address. There is one already. This link signs you in; it works once, for 30 minutes."),
      link("Sign in", href),
      paragraph("If it was not you, do nothing."),
    ],
  };
}

export function signInLink({ name, link: href }: MessageFacts["sign-in-link"]): Draft {
  return {
    subject: "Your link to sign in, good for 30 minutes",
    parts: [
      paragraph(`Hello ${name},`),
      paragraph("this link signs you in. It works once, within the next 30 minutes."),
      link("Sign in", href),
      paragraph("If you did not ask for it, do nothing."),
    ],
  };
}

const roleInWords: Record<string, string> = {
  chaperone: "come along as a chaperone",
  leader: "lead outings",
  coordinator: "work with us as a coordinator",
  admin: "look after accounts and settings",
  guardian: "register your children",
};

export function invitation({ name, role, from, link: href }: MessageFacts["invitation"]): Draft {
  return {
    subject: `${from || "We"} invited you: choose a password`,
    parts: [
      paragraph(`Hello ${name},`),
      paragraph(`${from || "We"} would like you to ${roleInWords[role] ?? "join us"}. Open the link and choose a password; it works for 14 days.`),
      link("Accept the invitation", href),
      paragraph("If you have an account already, the link takes you to the sign-in page."),
    ],
  };
}
