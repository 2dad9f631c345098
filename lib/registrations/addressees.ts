import type { Connection } from "@/db/connection";
import { listAnswersOf } from "@/lib/helpers/helper-store";
import type { Outing } from "@/lib/outings/outing";
import type { Person } from "@/lib/people/person";
import { findPerson } from "@/lib/people/person-store";
import { listRegistrationsOf } from "./registration-store";

/** Everybody a change of the day concerns: families with a seat or waiting for one, and adults who have not said no. */
export function addresseesOf(conn: Connection, now: string, outing: Outing): Person[] {
  const families = listRegistrationsOf(conn, outing.id, ["confirmed", "held", "waiting"], now).map((one) => one.registeredBy);
  const helpers = listAnswersOf(conn, outing.id).filter((one) => one.state !== "no").map((one) => one.personId);
  return [...new Set([...families, ...helpers])].flatMap((id) => findPerson(conn, id) ?? []);
}
