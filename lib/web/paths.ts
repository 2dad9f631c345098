import type { Route } from "next";

/** Addresses with an id in them, in one place: the checker knows every page, but not what is put into its address. */
export const pathTo = {
  outing: (slug: string) => `/outings/${slug}` as Route,
  registering: (slug: string) => `/outings/${slug}/register` as Route,
  child: (participantId: string) => `/family/children/${participantId}` as Route,
  registration: (id: string) => `/family/registrations/${id}` as Route,
  registrationStep: (id: string, step: "needs" | "waiver" | "fee") => `/family/registrations/${id}/${step}` as Route,
  deskOuting: (slug: string) => `/desk/outings/${slug}` as Route,
  deskRoom: (slug: string, room: "edit" | "helpers" | "cover" | "papers") => `/desk/outings/${slug}/${room}` as Route,
  fieldDay: (slug: string) => `/field/${slug}` as Route,
};
