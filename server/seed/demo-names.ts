import type { Random } from "#shared/simulation/random.ts";

/* Everything here is invented. A shop or person of such a name, should one exist, is not meant. */

const firstHalves = [
  "Amber",
  "Bracken",
  "Cinder",
  "Dapple",
  "Elder",
  "Fallow",
  "Gander",
  "Harrow",
  "Iron",
  "Juniper",
  "Kettle",
  "Larch",
  "Marl",
  "Nettle",
  "Otter",
  "Pewter",
  "Quarrel",
  "Rook",
  "Sedge",
  "Thistle",
  "Umber",
  "Vetch",
  "Wicket",
  "Yarrow",
];
const secondHalves = [
  "beck",
  "combe",
  "croft",
  "dale",
  "fold",
  "garth",
  "hollow",
  "lathe",
  "mere",
  "shaw",
  "stead",
  "wick",
];
const trades = ["Cutting", "Fabrication", "Ironwork", "Metalwork", "Plate", "Sheet and Plate", "Welding", "Works"];
const placeEndings = ["Nether", "Upper", "Little", "Great", "Old", "East", "West", "Long"];
const givenNames = [
  "Ada",
  "Bo",
  "Cass",
  "Dov",
  "Edda",
  "Finn",
  "Greta",
  "Hal",
  "Ines",
  "Jory",
  "Kit",
  "Lena",
  "Moss",
  "Nell",
  "Odo",
  "Perl",
  "Quin",
  "Rafe",
  "Sunna",
  "Tibb",
  "Ulla",
  "Vern",
  "Wyn",
  "Yves",
];

const half = (random: Random) => `${random.pick(firstHalves)}${random.pick(secondHalves)}`;

/** A shop's name, its place and the domain of its invented e-mail addresses, none of them given out before. */
export function inventShop(random: Random, taken: Set<string>): { name: string; place: string; domain: string } {
  for (;;) {
    const stem = half(random);
    // 288 stems run out in large networks; a number keeps the names apart then.
    const tag = taken.size < 200 ? stem : `${stem} ${random.whole(2, 99_999)}`;
    if (taken.has(tag)) continue;
    taken.add(tag);
    return {
      name: `${tag} ${random.pick(trades)}`,
      place: `${random.pick(placeEndings)} ${half(random)}`,
      domain: `${tag.toLowerCase().replace(" ", "-")}.example`,
    };
  }
}

export function inventPerson(random: Random): string {
  return `${random.pick(givenNames)} ${half(random)}`;
}

export const machineNames = ["Front table", "Back table", "Yard table", "Long bed", "Small bed"] as const;
