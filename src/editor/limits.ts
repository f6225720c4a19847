/** A file of measurements or parts larger than this is not read by the editor. */
export const MAX_FILE_BYTES = 256 * 1024 * 1024;

/** Bytes of a file between two pauses in which the editor can do other things. */
export const READ_CHUNK_BYTES = 1024 * 1024;

/** Names that one pattern (`files vendor/*.s2p`) may stand for. */
export const MAX_PATTERN_FILES = 2_000;

/** Rounds of loading: the description's files, then those that a drawer names; more would be a circle. */
export const MAX_LOADING_ROUNDS = 4;

/** Files of one description. */
export const MAX_FILES = 4_000;

/** Folders that are watched at the same time. */
export const MAX_WATCHED_FOLDERS = 64;

/** When to look, after a folder began to be watched, whether something changed before the watcher was awake. */
export const SETTLING_LOOKS_MS = [500, 2_000, 6_000];

/** Where one evaluation takes longer than this, the next one waits as long as the last took, so that typing stays smooth. */
export const SMOOTH_STUDY_MS = 30;

/** No evaluation waits longer than this for a pause in the typing. */
export const MAX_STUDY_DELAY_MS = 400;

/** A solver that works for a text which has changed since gets so long to finish before it is ended. */
export const SUPERSEDED_GRACE_MS = 150;

/** Solving that takes longer than this shows that it goes on. */
export const PROGRESS_AFTER_MS = 500;

/** A solver that gives no sign for so long is taken for dead. */
export const HANGING_AFTER_MS = 60_000;

/** Solutions that are asked for: what the panel lists. */
export const CANDIDATES = 10;

/** Builds are studied once nothing has been typed for so long. */
export const SPREAD_DELAY_MS = 250;

/** Channels whose coverage is kept for one version of a description. */
export const COVERAGES_KEPT = 64;

/** A report waits so long for builds that are being made. */
export const REPORT_WAITS_MS = 60_000;

/** Files that are offered while one writes where a file's name may stand, and folders that are looked into for them. */
export const MAX_FILES_NEARBY = 200;
