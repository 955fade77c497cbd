/** Which reaction of the library each published value is about, over species ids, and what is read from it:
 *  E0 = -dG / (n F) with n electrons consumed, V; logK; pK = -logK; K. The temperature stands in the row's conditions, else 25 C. */
export interface CheckReaction {
  readonly reaction: string;
  readonly read: "E0" | "logK" | "pK" | "K";
}

const E0 = (reaction: string): CheckReaction => ({ reaction, read: "E0" });
const logK = (reaction: string): CheckReaction => ({ reaction, read: "logK" });
const pK = (reaction: string): CheckReaction => ({ reaction, read: "pK" });
const K = (reaction: string): CheckReaction => ({ reaction, read: "K" });

const bisulfate = pK("HSO4^-(aq) = H^+(aq) + SO4^2-(aq)");
const ammonium = pK("NH4^+(aq) = H^+(aq) + NH3(aq)");
const carbonic = pK("CO2(aq) + H2O(l) = H^+(aq) + HCO3^-(aq)");
const bicarbonate = pK("HCO3^-(aq) = H^+(aq) + CO3^2-(aq)");
const sulfide = pK("H2S(aq) = H^+(aq) + HS^-(aq)");
const water = pK("H2O(l) = H^+(aq) + OH^-(aq)");
const cyanide = pK("HCN(aq) = H^+(aq) + CN^-(aq)");

export const checkReactions: Readonly<Record<string, CheckReaction>> = {
  "E0-O2/H2O2": E0("O2(g) + 2 H^+(aq) + 2 e^- = H2O2(aq)"),
  "E0-H2O2/H2O": E0("H2O2(aq) + 2 H^+(aq) + 2 e^- = 2 H2O(l)"),
  "E0-Fe3/Fe2": E0("Fe^3+(aq) + e^- = Fe^2+(aq)"),
  "E0-Fe2/Fe": E0("Fe^2+(aq) + 2 e^- = Fe(s)"),
  "E0-Cu2/Cu": E0("Cu^2+(aq) + 2 e^- = Cu(s)"),
  "E0-Cu2/Cu1": E0("Cu^2+(aq) + e^- = Cu^+(aq)"),
  "E0-Cu1/Cu": E0("Cu^+(aq) + e^- = Cu(s)"),
  "E0-Zn2/Zn": E0("Zn^2+(aq) + 2 e^- = Zn(s)"),
  "E0-Co2/Co": E0("Co^2+(aq) + 2 e^- = Co(s)"),
  "E0-Ag1/Ag": E0("Ag^+(aq) + e^- = Ag(s)"),
  "E0-AgCl/Ag": E0("AgCl(s,chlorargyrite) + e^- = Ag(s) + Cl^-(aq)"),
  "E0-Hg2Cl2/Hg": E0("Hg2Cl2(s,calomel) + 2 e^- = 2 Hg(l) + 2 Cl^-(aq)"),
  "E0-Au3/Au": E0("Au^3+(aq) + 3 e^- = Au(s)"),
  "E0-Au1/Au": E0("Au^+(aq) + e^- = Au(s)"),
  "E0-AuCN2/Au": E0("Au(CN)2^-(aq) + e^- = Au(s) + 2 CN^-(aq)"),
  "E0-AgCN2/Ag": E0("Ag(CN)2^-(aq) + e^- = Ag(s) + 2 CN^-(aq)"),
  "E0-AgNH32/Ag": E0("Ag(NH3)2^+(aq) + e^- = Ag(s) + 2 NH3(aq)"),
  "E0-AgS2O32/Ag": E0("Ag(S2O3)2^3-(aq) + e^- = Ag(s) + 2 S2O3^2-(aq)"),
  "E0-AuCl4/Au": E0("AuCl4^-(aq) + 3 e^- = Au(s) + 4 Cl^-(aq)"),
  "E0-PtCl6/PtCl4": E0("PtCl6^2-(aq) + 2 e^- = PtCl4^2-(aq) + 2 Cl^-(aq)"),
  "E0-PdCl4/Pd": E0("PdCl4^2-(aq) + 2 e^- = Pd(s) + 4 Cl^-(aq)"),
  "E0-MnO2/Mn2": E0("MnO2(s,pyrolusite) + 4 H^+(aq) + 2 e^- = Mn^2+(aq) + 2 H2O(l)"),
  "E0-MnO4/Mn2": E0("MnO4^-(aq) + 8 H^+(aq) + 5 e^- = Mn^2+(aq) + 4 H2O(l)"),
  "E0-Cl2/Cl": E0("Cl2(g) + 2 e^- = 2 Cl^-(aq)"),
  "E0-PbSO4/Pb": E0("PbSO4(s) + 2 e^- = Pb(s) + SO4^2-(aq)"),
  "E0-Sn4/Sn2": E0("Sn^4+(aq) + 2 e^- = Sn^2+(aq)"),
  "E0-Cr2O7/Cr3": E0("Cr2O7^2-(aq) + 14 H^+(aq) + 6 e^- = 2 Cr^3+(aq) + 7 H2O(l)"),
  // HAsO2 is H3AsO3 less one H2O.
  "E0-H3AsO4/HAsO2": E0("H3AsO4(aq) + 2 H^+(aq) + 2 e^- = H3AsO3(aq) + H2O(l)"),
  "E0-SO4/H2SO3": E0("SO4^2-(aq) + 4 H^+(aq) + 2 e^- = H2SO3(aq) + H2O(l)"),
  "practice-Cu2/Cu": E0("Cu^2+(aq) + 2 e^- = Cu(s)"),
  "practice-Cu2/Cu1": E0("Cu^2+(aq) + e^- = Cu^+(aq)"),
  "haz-AsH3": E0("As(s) + 3 H^+(aq) + 3 e^- = AsH3(g)"),

  "pK-HSO4": bisulfate,
  "pK-H2S-1": sulfide,
  "pK-NH4": ammonium,
  "pK-HCN": cyanide,
  "pK-H2CO3-1": carbonic,
  "pK-H2CO3-2": bicarbonate,
  "pK-HF": pK("HF(aq) = H^+(aq) + F^-(aq)"),
  "pK-H2SO3-1": pK("H2SO3(aq) = H^+(aq) + HSO3^-(aq)"),
  "pK-H2SO3-2": pK("HSO3^-(aq) = H^+(aq) + SO3^2-(aq)"),
  "pK-H2O2": pK("H2O2(aq) = H^+(aq) + HO2^-(aq)"),
  "pK-H3PO4-1": pK("H3PO4(aq) = H^+(aq) + H2PO4^-(aq)"),
  "pK-H3PO4-2": pK("H2PO4^-(aq) = H^+(aq) + HPO4^2-(aq)"),
  "pK-H3AsO4-1": pK("H3AsO4(aq) = H^+(aq) + H2AsO4^-(aq)"),
  "pK-H3AsO4-3": pK("HAsO4^2-(aq) = H^+(aq) + AsO4^3-(aq)"),
  "pK-GLY-1": pK("C2H6NO2^+(aq) = H^+(aq) + C2H5NO2(aq)"),
  "pK-GLY-2": pK("C2H5NO2(aq) = H^+(aq) + C2H4NO2^-(aq)"),

  "pKw-IAPWS-100": water,
  "pKw-IAPWS-150": water,
  "pKw-IAPWS-200": water,
  "pKw-IAPWS-250": water,
  "pK2-HSO4-D90-60": bisulfate,
  "pK2-HSO4-D90-100": bisulfate,
  "pK2-HSO4-D90-150": bisulfate,
  "pK2-HSO4-D90-200": bisulfate,
  "pK2-HSO4-D90-250": bisulfate,
  "pK2-HSO4-MJ66-100": bisulfate,
  "pK2-HSO4-MJ66-150": bisulfate,
  "pK1-H2S-T-5": sulfide,
  "pK1-H2S-T-25": sulfide,
  "pK-NH4-T-0": ammonium,
  "pK-NH4-T-25": ammonium,
  "pK-NH4-T-50": ammonium,
  "pK1-H2CO3-T-25": carbonic,
  "pK2-H2CO3-T-25": bicarbonate,
  "pK1-H2CO3-T-100": carbonic,
  "pK2-H2CO3-T-150": bicarbonate,
  "pK1-H2CO3-T-200": carbonic,
  "pK2-H2CO3-T-200": bicarbonate,
  "pK-HCN-T-10": cyanide,

  "logKsp-AgCl": logK("AgCl(s,chlorargyrite) = Ag^+(aq) + Cl^-(aq)"),
  "logKsp-CaSO4.2H2O": logK("CaSO4.2H2O(s,gypsum) = Ca^2+(aq) + SO4^2-(aq) + 2 H2O(l)"),
  "logKsp-gypsum-MR": logK("CaSO4.2H2O(s,gypsum) = Ca^2+(aq) + SO4^2-(aq) + 2 H2O(l)"),
  "logKsp-PbSO4": logK("PbSO4(s) = Pb^2+(aq) + SO4^2-(aq)"),
  "logKsp-Fe(OH)2": logK("Fe(OH)2(s) = Fe^2+(aq) + 2 OH^-(aq)"),
  "logKsp-Fe(OH)3": logK("Fe(OH)3(s,ferrihydrite) = Fe^3+(aq) + 3 OH^-(aq)"),
  "logKsp-Cu(OH)2": logK("Cu(OH)2(s) = Cu^2+(aq) + 2 OH^-(aq)"),
  "logKsp-Zn(OH)2": logK("Zn(OH)2(s,epsilon) = Zn^2+(aq) + 2 OH^-(aq)"),
  "logKsp-Ni(OH)2": logK("Ni(OH)2(s,beta) = Ni^2+(aq) + 2 OH^-(aq)"),
  "logKsp-Co(OH)2": logK("Co(OH)2(s,pink) = Co^2+(aq) + 2 OH^-(aq)"),
  "logKsp-Al(OH)3": logK("Al(OH)3(s,amorphous) = Al^3+(aq) + 3 OH^-(aq)"),
  "logKsp-FeCO3": logK("FeCO3(s,siderite) = Fe^2+(aq) + CO3^2-(aq)"),
  "logKsp-CuCl": logK("CuCl(s) = Cu^+(aq) + Cl^-(aq)"),

  "logbeta-AgCN2": logK("Ag^+(aq) + 2 CN^-(aq) = Ag(CN)2^-(aq)"),
  "logbeta-AgNH32": logK("Ag^+(aq) + 2 NH3(aq) = Ag(NH3)2^+(aq)"),
  "logbeta-NiNH36": logK("Ni^2+(aq) + 6 NH3(aq) = Ni(NH3)6^2+(aq)"),
  "logbeta-CoNH36": logK("Co^2+(aq) + 6 NH3(aq) = Co(NH3)6^2+(aq)"),
  "logbeta-CdNH34": logK("Cd^2+(aq) + 4 NH3(aq) = Cd(NH3)4^2+(aq)"),
  "logbeta-ZnCN4": logK("Zn^2+(aq) + 4 CN^-(aq) = Zn(CN)4^2-(aq)"),
  "logbeta-FeCN6-3": logK("Fe^3+(aq) + 6 CN^-(aq) = Fe(CN)6^3-(aq)"),
  "logbeta-ZnOH4": logK("Zn^2+(aq) + 4 OH^-(aq) = Zn(OH)4^2-(aq)"),
  "logbeta-AuCN2": logK("Au^+(aq) + 2 CN^-(aq) = Au(CN)2^-(aq)"),
  "logbeta-AuS2O32": logK("Au^+(aq) + 2 S2O3^2-(aq) = Au(S2O3)2^3-(aq)"),
  "logbeta-AgS2O32": logK("Ag^+(aq) + 2 S2O3^2-(aq) = Ag(S2O3)2^3-(aq)"),
  "logbeta-CuCN3": logK("Cu^+(aq) + 3 CN^-(aq) = Cu(CN)3^2-(aq)"),
  "logbeta-FeSO4^+": logK("Fe^3+(aq) + SO4^2-(aq) = FeSO4^+(aq)"),
  "logbeta-CuGLY2": logK("Cu^2+(aq) + 2 C2H4NO2^-(aq) = Cu(C2H4NO2)2(aq)"),

  "henry-NH3": K("NH3(g) = NH3(aq)"),
  "henry-CO2": K("CO2(g) = CO2(aq)"),
  "henry-O2": K("O2(g) = O2(aq)"),
  "henry-SO2": K("SO2(g) + H2O(l) = H2SO3(aq)"),
  "henry-HCN": K("HCN(g) = HCN(aq)"),
};
