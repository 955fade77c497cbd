import { z } from "zod";
import { plainWords } from "./plainWords";

// Every schema of forms, API, import and command line is built here, so that all of them complain in the same words.
z.config({ customError: plainWords });

export { z };
