import type { Source } from "../sources";

export const networkSources: readonly Source[] = [];
