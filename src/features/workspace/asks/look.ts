/** Short lists in the panel: a line an entry, what can be done with it at the right. */
export const lineList = "text-sm";
export const line = "hairline flex items-baseline justify-between gap-2 py-0.5";
