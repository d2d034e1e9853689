import type { LoadDifference } from '../load/difference';
import type { SettingChange } from '../policy/setting-change';

/** The closed list of what the history can tell. Past tense; one payload type each, versioned when it changes. */
export type AuditPayloads = {
  'person.signed-in': { readonly by: 'password' | 'badge' };
  'person.sign-in-refused': { readonly by: 'password' | 'badge'; readonly reason: string };
  'person.signed-out': { readonly everywhere: boolean };
  'person.changed-password': Record<string, never>;
  'person.changed-pin': Record<string, never>;
  'person.added': { readonly role: string };
  'person.changed': { readonly before: unknown; readonly after: unknown };
  'person.password-reset': { readonly expiresAt: string };
  'person.pin-reset': Record<string, never>;
  'person.badge-printed': Record<string, never>;
  'item.added': { readonly code: string };
  'item.changed': { readonly before: unknown; readonly after: unknown };
  'items.imported': { readonly added: number; readonly changed: number; readonly refused: number };
  'equipment.added': { readonly what: string; readonly code: string };
  'equipment.changed': { readonly what: string; readonly before: unknown; readonly after: unknown };
  'equipment.qualification-ended': {
    readonly sterilizer: string;
    readonly program: string;
    /** What of the program's cycle was changed. */
    readonly because: readonly string[];
  };
  'equipment.imported': {
    readonly what: string;
    readonly added: number;
    readonly changed: number;
    readonly refused: number;
  };
  'package.packed': { readonly code: string; readonly itemCode: string };
  'package.changed': { readonly before: unknown; readonly after: unknown };
  'packages.imported': { readonly added: number; readonly changed: number; readonly refused: number };
  'package.label-printed': { readonly copy: number; readonly reason: string | null };
  'package.staged': { readonly runId: string };
  'package.unstaged': { readonly runId: string };
  'run.added': { readonly name: string };
  'run.changed': { readonly before: unknown; readonly after: unknown };
  'air-removal-test.recorded': {
    readonly sterilizer: string;
    readonly result: 'passed' | 'failed';
    readonly testDay: string;
  };
  'lesson.finished': {
    readonly ruleId: string;
    readonly ruleSet: string;
    readonly tries: number;
    readonly loadId: string | null;
  };
  'load.opened': { readonly number: string; readonly listed: number };
  'load.package-scanned': { readonly packageCode: string; readonly entry: string; readonly difference: LoadDifference };
  'load.scan-refused': { readonly answer: string; readonly read: string; readonly entry: string };
  'load.package-moved': {
    readonly packageCode: string;
    /** What was done, in words; loads built before words were kept have none. */
    readonly words?: string;
    readonly difference: LoadDifference;
  };
  'load.package-taken-off': { readonly packageCode: string; readonly difference: LoadDifference };
  'load.arranged': { readonly packages: number; readonly words?: string; readonly difference: LoadDifference };
  'load.holder-placed': { readonly holder: string; readonly difference: LoadDifference };
  'load.holder-taken-off': { readonly holder: string; readonly difference: LoadDifference };
  'load.program-changed': { readonly before: string; readonly after: string; readonly difference: LoadDifference };
  'load.undone': { readonly undid: number; readonly difference: LoadDifference };
  'load.counted': { readonly shelf: string; readonly counted: number };
  'load.finding-accepted': { readonly findingKey: string; readonly ruleId: string; readonly reason: string };
  'load.sticker-printed': { readonly copy: number; readonly reason: string | null };
  'load.sticker-voided': { readonly reason: string };
  'load.close-refused': { readonly blocks: readonly string[] };
  'load.closed': { readonly digest: string; readonly ruleSet: string };
  'policy.change-proposed': {
    readonly changes: readonly SettingChange[];
    readonly effectiveOn: string;
    readonly reason: string;
  };
  'policy.change-confirmed': { readonly number: number; readonly effectiveOn: string };
  'policy.change-withdrawn': { readonly reason: string };
  'policy.change-refused': { readonly reason: string };
  'load.abandoned': { readonly reason: string };
};

export type AuditKind = keyof AuditPayloads;
