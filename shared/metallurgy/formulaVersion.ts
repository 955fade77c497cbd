/** Names the formulas of accounts and figures. Stored with every figure and printed in exports: raise it with any change that
 *  moves a number, and say in docs/changelog.md which one and why; figures that stand under another version are worked out
 *  again when the server starts. */
export const formulaVersion = "3";
