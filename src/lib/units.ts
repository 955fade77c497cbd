const shown: Readonly<Record<string, string>> = {
  C: "°C",
  um: "μm",
  "ug/L": "μg/L",
  m3: "m³",
  "t/m3": "t/m³",
  "kg/m3": "kg/m³",
  "oz/st": "oz/st",
  pH: "",
};

/** A unit of shared/entry/quantities.ts as it stands on the page: `um` → "μm". */
export const unitText = (unit: string): string => shown[unit] ?? unit;
