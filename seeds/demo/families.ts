import type { AccessProfile } from "@/lib/families/access-profile";

type Needs = Omit<AccessProfile, "contacts" | "pickUp">;

export type DemoChild = {
  nameUsed: string;
  legalName: string;
  /** On the day of the next outing. */
  age: number;
  daysSinceBirthday: number;
  needs: Needs;
};

export type DemoFamily = {
  guardian: string;
  relationship: string;
  phone: string;
  other: { name: string; relationship: string; phone: string };
  children: readonly DemoChild[];
};

/** A child who asks for the least; what a family says differently is put over it. */
function needs(different: Partial<Needs> = {}): Needs {
  return {
    travel: ["walks"],
    chair: null,
    transfer: null,
    restAfter: "60",
    guideWhen: ["not needed"],
    guideSide: "either",
    guideHold: "above the elbow",
    support: "minimal",
    reading: "large print",
    leaderNote: "",
    photo: "yes",
    voice: "yes",
    ...different,
  };
}

const vega: DemoFamily = {
  guardian: "Marisol Vega",
  relationship: "mother",
  phone: "360 555 0150",
  other: { name: "Tomás Vega", relationship: "father", phone: "360 555 0151" },
  children: [
    {
      nameUsed: "Ada",
      legalName: "Ada Vega Marín",
      age: 11,
      daysSinceBirthday: 120,
      needs: needs({
        travel: ["long cane"],
        guideWhen: ["uneven ground", "roads"],
        guideSide: "left",
        support: "occasional",
        reading: "contracted braille",
        leaderNote: "hand her the recorder, tell her what comes next",
      }),
    },
    {
      nameUsed: "José",
      legalName: "José Vega Marín",
      age: 15,
      daysSinceBirthday: 140,
      needs: needs({ leaderNote: "offer the side of the path away from the sun" }),
    },
  ],
};

const nguyen: DemoFamily = {
  guardian: "Nguyễn Thu Hà",
  relationship: "mother",
  phone: "360 555 0152",
  other: { name: "Nguyễn Văn Đức", relationship: "uncle", phone: "360 555 0153" },
  children: [
    {
      nameUsed: "Nguyễn Ánh",
      legalName: "Nguyễn Ngọc Ánh",
      age: 9,
      daysSinceBirthday: 150,
      needs: needs({
        guideWhen: ["all the time"],
        guideSide: "left",
        guideHold: "wrist",
        support: "close",
        reading: "none yet",
        restAfter: "20",
        leaderNote: "speak first, then touch the back of her hand",
      }),
    },
    {
      nameUsed: "Bảo",
      legalName: "Nguyễn Gia Bảo",
      age: 13,
      daysSinceBirthday: 160,
      needs: needs({
        travel: ["walker"],
        restAfter: "20",
        support: "close",
        reading: "electronic text",
        leaderNote: "say how far it is to the next seat",
        voice: "no",
      }),
    },
  ],
};

const zielinski: DemoFamily = {
  guardian: "Marek Zieliński",
  relationship: "father",
  phone: "360 555 0154",
  other: { name: "Jadwiga Zielińska", relationship: "grandmother", phone: "360 555 0155" },
  children: [
    {
      nameUsed: "Łucja",
      legalName: "Łucja Zielińska",
      age: 12,
      daysSinceBirthday: 170,
      needs: needs({ leaderNote: "let her lead the way for a while" }),
    },
    {
      nameUsed: "Staś",
      legalName: "Stanisław Zieliński",
      age: 8,
      daysSinceBirthday: 180,
      needs: needs({ guideWhen: ["crowds", "new places"], guideHold: "hand", support: "occasional", photo: "no" }),
    },
  ],
};

const deWit: DemoFamily = {
  guardian: "Femke de Wit",
  relationship: "mother",
  phone: "360 555 0156",
  other: { name: "Ruth de Wit", relationship: "aunt", phone: "360 555 0157" },
  children: [
    {
      nameUsed: "Zoë",
      legalName: "Zoë de Wit",
      age: 10,
      daysSinceBirthday: 190,
      needs: needs({ travel: ["long cane"], guideWhen: ["new places"], guideSide: "right", reading: "uncontracted braille" }),
    },
    {
      nameUsed: "Bram",
      legalName: "Bram de Wit",
      age: 13,
      daysSinceBirthday: 200,
      needs: needs({
        travel: ["long cane"],
        guideWhen: ["all the time"],
        guideSide: "right",
        support: "occasional",
        reading: "contracted braille",
        leaderNote: "name each change of ground before he steps on it",
      }),
    },
  ],
};

const okafor: DemoFamily = {
  guardian: "Ifeoma Okafor",
  relationship: "mother",
  phone: "360 555 0158",
  other: { name: "Emeka Okafor", relationship: "father", phone: "360 555 0159" },
  children: [
    {
      nameUsed: "Amaya",
      legalName: "Amaya Ngozi Okafor",
      age: 9,
      daysSinceBirthday: 210,
      needs: needs({
        guideWhen: ["all the time"],
        guideSide: "right",
        guideHold: "wrist",
        support: "close",
        reading: "audio",
        restAfter: "40",
        leaderNote: "shade every 20 minutes, hat on",
      }),
    },
    {
      nameUsed: "Chidi",
      legalName: "Chidiebere Okafor",
      age: 16,
      daysSinceBirthday: 220,
      needs: needs({ travel: ["long cane"], guideWhen: ["only if I ask"], support: "occasional", reading: "electronic text" }),
    },
  ],
};

const pappas: DemoFamily = {
  guardian: "Dora Pappas",
  relationship: "mother",
  phone: "360 555 0160",
  other: { name: "Nikos Pappas", relationship: "grandfather", phone: "360 555 0161" },
  children: [
    {
      nameUsed: "Ελένη",
      legalName: "Ελένη Παππά",
      age: 14,
      daysSinceBirthday: 230,
      needs: needs({
        travel: ["wheelchair"],
        chair: "power",
        transfer: "stays in the chair",
        leaderNote: "say Eleni, warn her of soft sand 3 meters ahead",
      }),
    },
  ],
};

const kealoha: DemoFamily = {
  guardian: "Malia Kealoha",
  relationship: "mother",
  phone: "360 555 0162",
  other: { name: "Tūtū Leilani", relationship: "grandmother", phone: "360 555 0163" },
  children: [
    {
      nameUsed: "Keʻala",
      legalName: "Keʻalaonaona Kealoha",
      age: 14,
      daysSinceBirthday: 240,
      needs: needs({
        travel: ["dog guide"],
        reading: "contracted braille",
        leaderNote: "do not pet Moss in harness, water for him every 40 minutes",
      }),
    },
  ],
};

const prosser: DemoFamily = {
  guardian: "Gareth Prosser",
  relationship: "father",
  phone: "360 555 0164",
  other: { name: "Anwen Prosser", relationship: "grandmother", phone: "360 555 0165" },
  children: [
    {
      nameUsed: "Wren",
      legalName: "Wren Prosser",
      age: 10,
      daysSinceBirthday: 125,
      needs: needs({
        travel: ["wheelchair"],
        chair: "pushed",
        transfer: "with one adult",
        support: "close",
        reading: "audio",
        restAfter: "40",
        leaderNote: "stop where the sound is good, two taps mean again",
        photo: "no",
      }),
    },
    {
      nameUsed: "Siân",
      legalName: "Siân Prosser",
      age: 8,
      daysSinceBirthday: 135,
      needs: needs({ guideWhen: ["crowds"], guideHold: "hand", support: "occasional", reading: "uncontracted braille" }),
    },
  ],
};

const bondar: DemoFamily = {
  guardian: "Nadia Bondar",
  relationship: "mother",
  phone: "360 555 0166",
  other: { name: "Orest Bondar", relationship: "uncle", phone: "360 555 0167" },
  children: [
    {
      nameUsed: "Леся",
      legalName: "Олександра Бондар",
      age: 11,
      daysSinceBirthday: 145,
      needs: needs({
        guideHold: "hand",
        support: "constant",
        reading: "none yet",
        restAfter: "20",
        leaderNote: "say Lesya, go to a quiet corner when she covers her ears",
        voice: "no",
      }),
    },
  ],
};

const yildiz: DemoFamily = {
  guardian: "Emre Yıldız",
  relationship: "father",
  phone: "360 555 0168",
  other: { name: "Çiğdem Yıldız", relationship: "mother", phone: "360 555 0169" },
  children: [
    {
      nameUsed: "Uğur",
      legalName: "Uğur Yıldız",
      age: 13,
      daysSinceBirthday: 155,
      needs: needs({ travel: ["long cane"], reading: "contracted braille" }),
    },
  ],
};

export const demoFamilies: readonly DemoFamily[] = [
  vega, nguyen, zielinski, deWit, okafor, pappas, kealoha, prosser, bondar, yildiz,
];
