import type { Capability } from '$lib/domain/people/capabilities';

/** Who may use a route: anybody, whoever is signed in, or holders of a capability (of any in a list). */
export type Rule = 'anyone' | 'signed-in' | Capability | readonly Capability[];

/** By route id, then by method; form actions are "POST ?/name", the default one "POST ?/default". */
export type Rules = Record<string, Record<string, Rule>>;
