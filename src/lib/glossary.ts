import type { GlossaryWord } from "./glossaryTitles";

/** The words of the product and of its trade, said in a sentence or two where they are used (components/Help). Read with the first
 *  look at one of them. */
export const glossary: Readonly<Record<GlossaryWord, readonly string[]>> = {
  carry: [
    "For a target: the activity the liquor must carry. Its dissolved fields are drawn at this activity, so a higher number makes them smaller.",
  ],
  atMost: [
    "For gangue: the most that may dissolve. Below this activity the metal counts as solid; a smaller number asks for a tighter hold.",
  ],
  leaveAtMost: [
    "For a metal to be won out of the liquor: the most that may remain dissolved when it has cemented or precipitated.",
  ],
  watched: ["Drawn and named on the map, but it neither opens nor shuts ground."],
  requirement: [
    "What the metal must be in this step: dissolved, solid (a compound or the metal), metal, compound, or free.",
  ],
  activity: [
    "Effective molality, a number without a unit. A tenor in g/L becomes an activity as molality times the activity coefficient gamma: 1 unless you say otherwise, Davies up to an ionic strength of 0.5, or typed.",
  ],
  total: [
    "All of a ligand or other component in the liquor, whatever it is bound to, in mol/L or g/L. It counts as an activity: molality with an activity coefficient of 1, a litre of liquor taken for a kilogram of water.",
    "In g/L each is weighed as the trade does: sulfate as SO4, carbonate as CO3, cyanide as CN, glycine as the acid.",
  ],
  freeAcidBand: [
    "Below pH 1.5 a sulfate loop is run on free acid by titration. A band in g/L is turned into pH at the set point: more acid is the shorter way in pH, less acid the longer. The margin counts the longer one on both sides, so it is never made out larger than it is.",
    "The conversion rests on the second dissociation of sulfuric acid and on activity coefficients by Davies, and is indicative beyond an ionic strength of 0.5.",
  ],
  solidsBasis: [
    "Which solids count. Feed: as they are in the feed. Fresh: those that form in hours, such as ferrihydrite. Aged: the most stable ones, such as hematite or goethite.",
    "Thermodynamics says what can happen, not how fast. The basis is how the plan speaks about time.",
  ],
  controlBand: [
    "How closely the loop on site holds pH and Eh. The set point’s margin is counted in these bands, so a poor loop gives an honest margin.",
  ],
  margin: [
    "How many control bands fit between the set point and the nearest window limit. Under one, the loop cannot hold the window.",
  ],
  reach: [
    "What an oxidant or reductant brings the slurry to. Solid: the range seen in stirred vessels on platinum. Thin line: the equilibrium potential of its couple, which vessels rarely show.",
  ],
  window: ["A connected piece of open ground: inside it every metal is as required."],
  robustWindow: [
    "The ground that stays open whatever temperature and activities do within the ranges stated here. It is drawn as an inner outline, with a deepest point of its own.",
  ],
  excludedHazard: [
    "Windows stay clear of ground where this gas would stand over the liquor: where its equilibrium pressure reaches the limit stated, as in a closed headspace. For HCN a site may state the pH it never goes below instead; its edge then cuts the window, counts in the margin, and is named among the limits.",
    "A line on a map protects nobody. Local codes, exposure limits in force, the site's procedures and licensed practice decide; gas detection and ventilation are theirs.",
  ],
  circuit: [
    "What stands around the vessel and no diagram shows: whether the liquor meets solvent extraction organic, the partial pressure of oxygen, the oxidants, reductants and cementing metals in use. Windows do not see it; the cautions do, and only what is named can be warned of.",
  ],
  windowLimit: ["One edge of a window: the metal and the reaction that shuts it there."],
  shutGround: [
    "Hatched ground is shut: the metal with that hatch is not as required. Ground that no metal shuts is open, and makes the window.",
  ],
  nextTrials: [
    "The largest untried gaps of the window: each point stands as far as can be, in control bands, from every comparable trial tried or planned and from the points proposed before it.",
    "They keep away from the window’s limits, so that a loop can hold them. Rejected trials and trials under other conditions do not count.",
  ],
  crosscut: [
    "The state of every metal along one line through the set point: along pH at its Eh, or along Eh at its pH.",
  ],
  mixedPotential: [
    "Where no couple of the liquor holds both forms above about 10 mg/L, the electrode reads a mixture. Eh is then a trend, and the margin counts pH alone.",
  ],
  sulfateReduction: [
    "Off: sulfate and sulfide never turn into each other, which is what happens below about 100 °C in hours. On: full equilibrium between them.",
  ],
  potentialScale: [
    "Potentials are solved against the standard hydrogen electrode (SHE) and shown on the scale you choose: SHE, or a reference electrode at its own temperature.",
    "A potential without its electrode is not a reading: the scale always stands beside the number.",
  ],
  grade: [
    "A: the value was seen in a published table when it was entered. B: a handbook value from memory whose G, H and S agree within 1 kJ. C: from memory and unchecked, or derived from a stability constant.",
  ],
  trustedRange: [
    "The temperatures for which the model of this species is meant. Outside it the number is still given, and every field drawn from it says so.",
  ],
  temperatureModel: [
    "How the free energy goes from 25 °C to T: heat capacity for solids and gases, entropy correspondence for simple ions, a held reaction where no entropy is known.",
  ],
  ligandGroup: [
    "A group of atoms the solver counts as one component, such as ammonia or cyanide. It binds metals but is never oxidised or taken apart.",
  ],
  pulpDensity: [
    "Dry solids as a share of the pulp’s mass, % w/w. At 20 % a kilogram of solids meets four kilograms of liquor, so a rich pulp makes a strong liquor.",
  ],
  fromHead: [
    "A metal’s tenor if the share named dissolves: head times solids per litre of liquor times extraction. The target is taken at 90 %, gangue at 0.1 %, what is only watched at 50 %: common practice, to be changed where you know better.",
  ],
  liquorTemperature: [
    "Free energies, water lines and fields are worked out at this temperature. Species whose model is not meant for it are named under Fields drawn.",
  ],
  frame: [
    "The ranges of pH and Eh the map shows and windows are looked for in. Where the frame cuts a window, the window may go on beyond it: widen the frame before trusting the margin.",
  ],
  waterBand: [
    "Between the two dashed lines water is stable at 1 bar: above the upper one it gives oxygen, below the lower one hydrogen. An overpotential moves a line outwards where the gas comes slowly on the surface at hand.",
    "In an oxidising step both bound windows; in a cementation hydrogen is a loss and a hazard, not a limit.",
  ],
  setPoint: [
    "The pH and Eh to run at: the middle of the largest box of control bands that fits into the window. It can be moved by hand on the map; the margin is then read from where it was put.",
  ],
  couples: [
    "Two oxidation states of one metal that the liquor holds together. Where both stand above about 10 mg/L they set Eh; the range given runs from one part in a hundred of either.",
  ],
  gasPressure: [
    "The pressure a closed headspace would tend to over this liquor at rest. It is no reading of the air, and quick reactions, such as arsine from fresh hydrogen, can exceed it.",
  ],
  overallReaction: [
    "From each mineral, metal or ion to the species that rules at the set point, balanced, with acid, base and oxidant counted per mole, per kilogram of metal and per tonne. It says how much, not how fast.",
  ],
  warnings: [
    "What the answer takes for granted: species outside their trusted temperature, ligands that would be drawn down, solids that may not form in time. The number stands; these say how far.",
  ],
};
