/** The product's own words, said in a sentence or two where they are used (see components/Help). */
export const glossary = {
  carry: {
    title: "Carry",
    text: [
      "For a target: the activity the liquor must carry. Its dissolved fields are drawn at this activity, so a higher number makes them smaller.",
    ],
  },
  atMost: {
    title: "At most",
    text: [
      "For gangue: the most that may dissolve. Below this activity the metal counts as solid; a smaller number asks for a tighter hold.",
    ],
  },
  leaveAtMost: {
    title: "Leave at most",
    text: [
      "For a metal to be won out of the liquor: the most that may remain dissolved when it has cemented or precipitated.",
    ],
  },
  watched: {
    title: "Watched",
    text: ["Drawn and named on the map, but it neither opens nor shuts ground."],
  },
  requirement: {
    title: "Requirement",
    text: [
      "What the metal must be in this step: dissolved, solid (a compound or the metal), metal, compound, or free.",
    ],
  },
  activity: {
    title: "Activity",
    text: [
      "Effective molality, a number without a unit. A tenor in g/L becomes an activity as molality times the activity coefficient gamma: 1 unless you say otherwise, Davies up to an ionic strength of 0.5, or typed.",
    ],
  },
  total: {
    title: "Total",
    text: [
      "All of a ligand or other component in the liquor, whatever it is bound to, in mol/L or g/L. It counts as an activity: molality with an activity coefficient of 1, a litre of liquor taken for a kilogram of water.",
      "In g/L each is weighed as the trade does: sulfate as SO4, carbonate as CO3, cyanide as CN, glycine as the acid.",
    ],
  },
  freeAcidBand: {
    title: "Band of free acid",
    text: [
      "Below pH 1.5 a sulfate loop is run on free acid by titration. A band in g/L is turned into pH at the set point: more acid is the shorter way in pH, less acid the longer. The margin counts the longer one on both sides, so it is never made out larger than it is.",
      "The conversion rests on the second dissociation of sulfuric acid and on activity coefficients by Davies, and is indicative beyond an ionic strength of 0.5.",
    ],
  },
  solidsBasis: {
    title: "Solids basis",
    text: [
      "Which solids count. Feed: as they are in the feed. Fresh: those that form in hours, such as ferrihydrite. Aged: the most stable ones, such as hematite or goethite.",
      "Thermodynamics says what can happen, not how fast. The basis is how the plan speaks about time.",
    ],
  },
  controlBand: {
    title: "Control band",
    text: [
      "How closely the loop on site holds pH and Eh. The set point’s margin is counted in these bands, so a poor loop gives an honest margin.",
    ],
  },
  margin: {
    title: "Margin",
    text: [
      "How many control bands fit between the set point and the nearest window limit. Under one, the loop cannot hold the window.",
    ],
  },
  reach: {
    title: "Reach",
    text: [
      "What an oxidant or reductant brings the slurry to. Solid: the range seen in stirred vessels on platinum. Thin line: the equilibrium potential of its couple, which vessels rarely show.",
    ],
  },
  window: {
    title: "Window",
    text: ["A connected piece of open ground: inside it every metal is as required."],
  },
  robustWindow: {
    title: "Window over ranges",
    text: [
      "The ground that stays open whatever temperature and activities do within the ranges stated here. It is drawn as an inner outline, with a deepest point of its own.",
    ],
  },
  excludedHazard: {
    title: "Kept out",
    text: [
      "Windows stay clear of ground where this gas would stand over the liquor: where its equilibrium pressure reaches the limit stated, as in a closed headspace. For HCN a site may state the pH it never goes below instead; its edge then cuts the window, counts in the margin, and is named among the limits.",
      "A line on a map protects nobody. Local codes, exposure limits in force, the site's procedures and licensed practice decide; gas detection and ventilation are theirs.",
    ],
  },
  windowLimit: {
    title: "Window limit",
    text: ["One edge of a window: the metal and the reaction that shuts it there."],
  },
  shutGround: {
    title: "Shut and open ground",
    text: [
      "Hatched ground is shut: the metal with that hatch is not as required. Ground that no metal shuts is open, and makes the window.",
    ],
  },
  nextTrials: {
    title: "Next trials",
    text: [
      "The largest untried gaps of the window: each point stands as far as can be, in control bands, from every comparable trial tried or planned and from the points proposed before it.",
      "They keep away from the window’s limits, so that a loop can hold them. Rejected trials and trials under other conditions do not count.",
    ],
  },
  crosscut: {
    title: "Crosscut",
    text: ["The state of every metal along one line through the set point: along pH at its Eh, or along Eh at its pH."],
  },
  mixedPotential: {
    title: "Mixed potential",
    text: [
      "Where no couple of the liquor holds both forms above about 10 mg/L, the electrode reads a mixture. Eh is then a trend, and the margin counts pH alone.",
    ],
  },
  sulfateReduction: {
    title: "Sulfate reduction",
    text: [
      "Off: sulfate and sulfide never turn into each other, which is what happens below about 100 °C in hours. On: full equilibrium between them.",
    ],
  },
  potentialScale: {
    title: "Potential scale",
    text: [
      "Potentials are solved against the standard hydrogen electrode (SHE) and shown on the scale you choose: SHE, or a reference electrode at its own temperature.",
      "A potential without its electrode is not a reading: the scale always stands beside the number.",
    ],
  },
  grade: {
    title: "Grade",
    text: [
      "A: the value was seen in a published table when it was entered. B: a handbook value from memory whose G, H and S agree within 1 kJ. C: from memory and unchecked, or derived from a stability constant.",
    ],
  },
  trustedRange: {
    title: "Trusted range",
    text: [
      "The temperatures for which the model of this species is meant. Outside it the number is still given, and every field drawn from it says so.",
    ],
  },
  temperatureModel: {
    title: "Temperature model",
    text: [
      "How the free energy goes from 25 °C to T: heat capacity for solids and gases, entropy correspondence for simple ions, a held reaction where no entropy is known.",
    ],
  },
  ligandGroup: {
    title: "Ligand group",
    text: [
      "A group of atoms the solver counts as one component, such as ammonia or cyanide. It binds metals but is never oxidised or taken apart.",
    ],
  },
} as const;

export type GlossaryWord = keyof typeof glossary;
