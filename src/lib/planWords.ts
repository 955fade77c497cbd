export * from "../../shared/words/planWords";
