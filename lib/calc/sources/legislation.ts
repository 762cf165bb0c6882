import type { Source } from "../sources";

export const legislationSources: readonly Source[] = [];
