import { z } from "zod";

// zod probes `new Function` to speed up parsing; the content security policy forbids it. Must be imported before any schema.
z.config({ jitless: true });
