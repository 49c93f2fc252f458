import { z } from "zod";

// zod otherwise tries whether code may be made from text, which the content policy forbids and reports.
z.config({ jitless: true });
