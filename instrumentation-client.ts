import { config } from "zod/v4/core";

// Runs before anything else on a page. Forms check with zod, which else would try to compile its checks from text: the pages' policy forbids that.
config({ jitless: true });
