import type { Source } from "../sources";

export const wiringSources: readonly Source[] = [];
