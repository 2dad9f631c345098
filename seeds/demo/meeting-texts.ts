import { dayInWords, instantAt, minutesLater, timeInWords } from "@/lib/shared/dates";
import type { SiteSlug } from "./sites";

/** What a meeting text has to agree with: the outing's own title, day and hours, and who is there. */
export type MeetingDay = {
  title: string;
  day: string;
  startTime: string;
  endTime: string;
  zone: string;
  /** Calls from the meeting point. */
  greeter: string;
  /** Waits where buses and paratransit stop. */
  atTheStop: string;
  phone: string;
  checkedOnInWords: string;
};

type Words = ReturnType<typeof wordsFor>;

function wordsFor({ day, startTime, endTime, zone, ...rest }: MeetingDay) {
  const start = instantAt(day, startTime, zone);
  const time = (minutes: number) => timeInWords(minutesLater(start, minutes), zone);
  return {
    ...rest,
    date: dayInWords(start, zone),
    arriveBy: time(-15),
    greetFrom: time(-40),
    start: time(0),
    waitUntil: time(15),
    end: timeInWords(instantAt(day, endTime, zone), zone),
  };
}

/** Instructions to the meeting point of a site, in the order people need them, in whole sentences. */
export function meetingText(site: SiteSlug, day: MeetingDay): string {
  const words = wordsFor(day);
  return [...opening(words, spots[site]), ...ways[site](words), ...closing(words, spots[site])].join("\n\n");
}

const spots: Record<SiteSlug, string> = {
  "heron-spit": "the long bench",
  "alder-bog-boardwalk": "the covered bench",
  "old-ferry-landing": "the ticket porch",
  "cinder-hill": "the stone wall",
};

function opening(words: Words, spot: string): string[] {
  return [
    `${words.title}, ${words.date}. Be at ${spot} by ${words.arriveBy} We set out at ${words.start} and finish at ` +
      `${spot} again at ${words.end}`,
    `On the day, call or text ${words.greeter} at ${words.phone}. Voicemail is checked until ${words.start}`,
  ].map(endSentences);
}

/** "9 a.m." ends a sentence with its own full stop, "noon" does not. */
function endSentences(text: string): string {
  return text.replaceAll(/\b(noon|midnight)(?= [A-Z]|$)/g, "$1.");
}

function legs(...each: string[]): string {
  return each.map((leg, at) => `${at + 1}. ${leg}`).join("\n");
}

function closing(words: Words, spot: string): string[] {
  return [
    `How you will know us: ${words.greeter} calls “Listening club, this is ${words.greeter}” every minute ` +
      `from ${words.greetFrom}`,
    "If you are late or lost: stay where you are and call. Somebody comes to you. " +
      `The group waits at ${spot} until ${words.waitUntil}`,
    "Weather: we decide by 7 p.m. on the evening before and write to you by e-mail. You can also call and ask.",
    `Checked on the ground by Robin Alder, and by Tove Lindqvist, who is blind, on ${words.checkedOnInWords}. ` +
      "They go again in the week before the outing.",
  ].map(endSentences);
}

const ways: Record<SiteSlug, (words: Words) => string[]> = {
  "heron-spit": heronSpit,
  "alder-bog-boardwalk": alderBog,
  "old-ferry-landing": oldFerryLanding,
  "cinder-hill": cinderHill,
};

function heronSpit({ atTheStop, greetFrom, arriveBy }: Words): string[] {
  return [
    "For drivers: the address is 4100 Spit Road, Saltgrass. Coming from town, cross the metal bridge, which hums under " +
      "the tires. The entrance is the second one on your right, 0.4 miles after the bridge. Navigation may send you to " +
      "the marina on Dock Street: ignore it and stay on Spit Road. The gate is open from 8 a.m. to 6 p.m. The parking " +
      "lot is packed gravel, and there is no fee. Two accessible bays lie along its left edge, with 9 feet of clearance " +
      "for vans. The drop-off curb is on your right, 20 feet after the gate, with room to turn.",
    "By bus or paratransit: tell the operator “Heron Spit, Spit Road gate”. Bus 12 stops on the park's side of the " +
      `road, 150 feet before the gate. ${atTheStop} waits at the stop from ${greetFrom} to ${arriveBy}`,
    "From the drop-off curb to the long bench:",
    legs(
      "Start on the curb with the parking lot behind you. You are facing the low hum of the pump house.",
      "Facing the hum, move straight ahead 60 feet, about 24 adult steps. The ground is loose gravel, and a wooden " +
        "fence is on your right. The gravel ends at flat concrete. If you feel grass, you have gone too far left.",
      "Facing the hum, turn left. Move 30 feet along the concrete with the pump house wall on your right. Your cane " +
        "or foot meets the end of the long bench. If you touch a chain, you have gone 6 feet too far.",
    ),
    "The spot: smooth concrete underfoot, and a wooden bench 12 feet long with the wall at its back. The hum is behind " +
      "you, and the waves are in front. The wind comes off the water. A roof covers half of the bench.",
    "With low vision: the bench is a dark bar, as long as a car, against a pale wall. On a bright morning the sun is in " +
      "your face in leg 3.",
    "Take care: cars move slowly on your left in leg 2. In front of the bench, 40 feet away, the ground drops 1 foot " +
      "to the beach. Bikes pass behind the fence and ring a bell.",
    "Restroom and water: facing the waves from the bench, move 25 feet to your left along the wall. The door has a " +
      "round metal handle, and the tap is beside it. Dogs have the grass on the left of the parking lot. The quiet " +
      "place is the end of the bench farthest from the door.",
  ].map(endSentences);
}

function alderBog({ atTheStop, greetFrom, arriveBy }: Words): string[] {
  return [
    "For drivers: the address is 27 Bog Lane, Saltgrass. Coming from the highway, the entrance is on your left, 1.1 " +
      "miles after the rail crossing. Navigation may name the farm next door: ignore it and go on to the second gate. " +
      "The gate is open until 9 p.m. The parking lot is packed gravel, and there is no fee. One accessible bay is " +
      "beside the gate on the right, with a firm surface and no height limit. Drop-off is in front of that bay.",
    "By bus or paratransit: no bus comes to Bog Lane. Tell the paratransit operator “Alder Bog, second gate”. " +
      `${atTheStop} waits at the gate from ${greetFrom} to ${arriveBy}`,
    "From the gate to the covered bench:",
    legs(
      "Start with your back to the gate. The metal rattles when you touch it. You are facing the sound of alder leaves.",
      "Facing the leaves, move straight ahead 90 feet, about 36 adult steps. The ground is packed gravel, and it " +
        "slopes down a little. Keep the log edge on your right. If the ground turns soft, you have gone too far left.",
      "Stop where the gravel turns to wood that sounds hollow underfoot. A rail begins on your right.",
      "Facing along the rail, move 15 feet on the boards. The covered bench is on your left, and the roof makes your " +
        "voice echo. If the rail bends to the right, you have gone 20 feet too far.",
    ),
    "The spot: boards underfoot, a bench with a back, and a roof overhead. You smell wet earth. Water drips on your " +
      "right, below the rail. The bench is out of the wind.",
    "With low vision: the roof is a dark square above pale boards. It may be dusk when we finish, so bring a lamp if " +
      "it helps you.",
    "Take care: the boards are slick when wet. Past the bench there is no rail on the left, and the bog is 1 foot " +
      "below. The roof is 7 feet high.",
    "Restroom and water: beside the gate, 12 feet to its right as you face the road. The tap is outside its door. " +
      "Dogs have the gravel behind the restroom. The quiet place is your seat at the back of the bench.",
  ].map(endSentences);
}

function oldFerryLanding({ atTheStop, greetFrom, arriveBy }: Words): string[] {
  return [
    "For drivers: the address is 1 Landing Street, Saltgrass. Coming down Landing Street, the paved lot is at its end, " +
      "on your left. Navigation may send you to the new ferry dock: ignore it and go on 0.3 miles. Parking is free " +
      "for three hours. Three accessible bays are along the building, with 10 feet of clearance for vans. The drop-off " +
      "curb is in front of them, with a ramp at its middle and room to turn.",
    "By bus or paratransit: tell the operator “Old Ferry Landing, ferry house”. Bus 3 ends on the same side as the " +
      `ferry house, 80 feet before it. ${atTheStop} waits at the stop from ${greetFrom} to ${arriveBy}`,
    "From the drop-off curb to the ticket porch:",
    legs(
      "Start at the ramp in the middle of the curb, with the parking lot behind you. You are facing the clink of ropes " +
        "against masts.",
      "Facing the ropes, move straight ahead 40 feet, about 16 adult steps, on smooth paving. A row of bumps underfoot " +
        "crosses your way: stop there. If you hear water right in front, you have gone too far.",
      "Facing the ropes, turn right. Move 25 feet with the brick wall on your right. The floor turns to wood, and the " +
        "sound closes in around you: that is the ticket porch. If the wall ends, you have gone 10 feet too far.",
    ),
    "The spot: wooden boards underfoot, a brass rail at the height of your waist, and a bench along the wall. Ropes and " +
      "hulls creak on the water side. The porch has a roof and is out of the wind.",
    "With low vision: the porch is a dark opening, as wide as two doors, in a light brick wall. The water glares from " +
      "noon on, on your left.",
    "Take care: the quay edge is 30 feet from the porch, with a rail 3 feet high. Carts cross the paving in leg 2 and " +
      "their wheels rattle.",
    "Restroom and water: facing the rail of the porch, move 130 feet to your right along the wall. The restroom is " +
      "the second door, and the tap is inside. Dogs have the grass behind the ferry house. The quiet place is the " +
      "old waiting room, the first door.",
  ].map(endSentences);
}

function cinderHill({ atTheStop, greetFrom, arriveBy }: Words): string[] {
  return [
    "For drivers: the address is 800 Quarry Road, Saltgrass. Coming from town, the lower gate is on your right, 2.2 " +
      "miles after the grange hall. Navigation may send you to the upper gate: ignore it, that road is steep. The " +
      "parking lot is packed cinder, and there is no fee. Two accessible bays are beside the gate on the left, with no " +
      "height limit. Drop-off is in front of them, with room to turn.",
    "By bus or paratransit: no bus comes to Quarry Road. Tell the paratransit operator “Cinder Hill, lower gate”. " +
      `${atTheStop} waits at the gate from ${greetFrom} to ${arriveBy}`,
    "From the gate to the stone wall:",
    legs(
      "Start with your back to the road. The wooden gate is in front of you, and it creaks when it swings.",
      "Facing the gate, move through it and straight ahead 50 feet, about 20 adult steps. The cinder crunches underfoot. " +
        "A rope rail is on your left. If the crunch stops, you have gone too far right.",
      "Facing along the rope, turn left where it ends. Move 10 feet. Your hand meets a stone wall, waist high. If the " +
        "ground rises, you have passed the wall by 15 feet.",
    ),
    "The spot: crunching cinder underfoot, rough stone at your back, and a flat top to sit on. Wind in the wires hums " +
      "above you. The wall keeps the wind off when you sit.",
    "With low vision: the wall is a long light band above dark ground. In the afternoon the sun is behind you.",
    "Take care: a cattle grid lies 8 feet to the right of the gate. Go through the gate, not over the grid. Bikes come " +
      "downhill on the left side of the path.",
    "Restroom and water: a restroom is 30 feet behind the wall, on cinder, with a ramp and a rail. There is no tap, so " +
      "bring water. Dogs have the grass across from the restroom. The quiet place is the far end of the wall.",
  ].map(endSentences);
}
