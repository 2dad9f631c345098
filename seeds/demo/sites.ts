import { insertSite } from "@/lib/outings/outing-store";
import type { Story } from "./story";

export const siteSlugs = ["heron-spit", "alder-bog-boardwalk", "old-ferry-landing", "cinder-hill"] as const;
export type SiteSlug = (typeof siteSlugs)[number];

const sites = {
  "heron-spit": {
    name: "Heron Spit",
    landManager: "Saltgrass County Shorelands Office",
    ground: "Packed gravel, then firm sand; one slope.",
    meetingPoint: "The long bench along the pump house wall, at the Spit Road parking lot.",
  },
  "alder-bog-boardwalk": {
    name: "Alder Bog Boardwalk",
    landManager: "Three Creeks Wetland District",
    ground: "Boardwalk all the way, rail on the right.",
    meetingPoint: "The covered bench where the gravel ends and the boardwalk begins, on Bog Lane.",
  },
  "old-ferry-landing": {
    name: "Old Ferry Landing",
    landManager: "Saltgrass Harbor Heritage Board",
    ground: "Paved, sheltered, restrooms 40 meters away.",
    meetingPoint: "The ticket porch of the old ferry house, at the end of Landing Street.",
  },
  "cinder-hill": {
    name: "Cinder Hill",
    landManager: "North Sound Forest Reserve",
    ground: "Packed cinder path, one long gentle slope, a bench every 60 meters.",
    meetingPoint: "The stone wall beside the lower gate, on Quarry Road.",
  },
} as const;

/** The four places, with their ids by slug. */
export function seedSites(story: Story): Record<SiteSlug, string> {
  const insert = (slug: SiteSlug) => insertSite(story.conn, { ...sites[slug], slug, zone: story.zone });
  return {
    "heron-spit": insert("heron-spit"),
    "alder-bog-boardwalk": insert("alder-bog-boardwalk"),
    "old-ferry-landing": insert("old-ferry-landing"),
    "cinder-hill": insert("cinder-hill"),
  };
}
