import { standard, whole, seal, sent, heard, approve, job, planned, apply, type PlannedJob } from "./cases";

/** Jobs in hand this week: planned, half recorded, ready to seal, freshly sealed, stopped. */
export const freshJobs: readonly PlannedJob[] = [
  job(137, ["64 Tenter Field", "Oxcombe", "XA3 7HJ"], "Maud Eccles", "14", 3, 2, [], { photos: standard }),
  job(138, ["11 Sluice Gate Lane", "Saltmere", "XA1 9KL"], "Ewan Firth", "12", 2, 1, [], { change: "loopNotLookedAt" }),
  job(139, ["Unit 3, Tarn Mill", "Thrale", "XA5 2JK"], "Tarn Mill Joinery", "23", 19, 7, [seal(6)], {
    example: "clock-on-utc",
    change: "withCapacity",
    photos: [...standard, "default-hours-screen", "delay-screen", "first-use-prompt"],
    installer: "tam",
  }),
  job(140, ["11 Tithe Lane", "Oxcombe", "XA3 3MN"], "Pearl Haddon", "23", 26, 25, [seal(7), approve(2)], {
    photos: standard,
  }),
  job(
    141,
    ["6 Tarn Mill Cottages", "Thrale", "XA5 2PQ"],
    "Abel Rooke",
    "15",
    12,
    11,
    [
      seal(10),
      sent(9),
      { act: "return", ago: 0, reason: "Set the clock to local time and photograph the hours again." },
    ],
    { example: "clock-on-utc", change: "withCapacity", installer: "tam" },
  ),
  job(142, ["12 Quay Rise", "Saltmere", "XA1 2BC"], "Ines Calloway", "10", 29, 11, [seal(3)], {
    example: "notice-due-on-the-day",
    photos: standard,
  }),
  job(143, ["40 Ashlar Street", "Thrale", "XA5 7RS"], "Winnie Okoro", "22", 2, 1, [], { photos: standard }),
  job(
    144,
    ["Flat 2, Crane House", "Saltmere", "XA1 6TU"],
    "Roisin Magee",
    "ni",
    8,
    -12,
    [seal(6), sent(5), heard(4, "NIE-4502")],
    apply,
  ),
  job(145, ["22 Millstone Way", "Thrale", "XA5 8VW"], "Arlo Denham", "21", 1, 1, [], { change: "loadNotMeasured" }),
  job(146, ["70 Salter’s Reach", "Saltmere", "XA1 1XY"], "June Ridley", "19", 1, -3, [], planned),
  job(147, ["4 Ropewalk Lane", "Oxcombe", "XA3 4EF"], "Ines Calloway", "23", 12, 11, [seal(2)], {
    photos: whole,
    installer: "tam",
  }),
  job(148, ["Unit 7, Tarn Mill", "Thrale", "XA5 2ZA"], "Tarn Mill Pottery", "13", 8, 7, [seal(6)]),
  job(149, ["5 Beacon Fold", "Oxcombe", "XA3 9BC"], "Silas Quill", "11", 1, -4, [], planned),
  job(
    150,
    ["6 Millrace Drive", "Oxcombe", "XA3 6DE"],
    "Thea Vance",
    "14",
    7,
    6,
    [seal(3, "The maker has not sent the type-test reference yet.")],
    {
      example: "two-way",
      change: "twoWayNotice",
    },
  ),
  job(151, ["3 Tenter Close", "Oxcombe", "XA3 9LM"], "Kit Holloway", "14", 1, 0, [], {
    example: "two-way",
    photos: standard,
    installer: "tam",
  }),
  job(152, ["5 Bell Yard", "Thrale", "XA5 1BY"], "Hester Lamb", "23", 1, 0, [], {
    change: "halfFinished",
    photos: [
      "intake",
      "cut-out",
      "meter",
      "earth-terminal",
      "consumer-unit",
      "rating-plate",
      "chargepoint",
      "default-hours-screen",
      "delay-screen",
    ],
    installer: "tam",
  }),
  job(153, ["27 Sluice Street", "Saltmere", "XA1 7NP"], "Otto Farringdon", "16", 1, 11, [], {
    example: "stop",
    photos: ["cut-out", "damage"],
    installer: "tam",
  }),
  job(154, ["9 Hurdle Makers Row", "Thrale", "XA5 5FG"], "Mina Cole", "20", 1, -6, [], {
    ...planned,
    installer: "sole",
  }),
  job(155, ["30 Cordwainer Street", "Saltmere", "XA1 4HJ"], "Dev Anand", "22", 0, 0, [], {
    change: "intakeOnly",
    photos: [],
    installer: "joss",
  }),
  job(156, ["The Granary", "Oxcombe", "XA3 2PQ"], "Lotte Brook", "18", 0, -10, [], { ...apply, installer: "sole" }),
  job(157, ["13 Tanner’s Row", "Thrale", "XA5 9KL"], "Grace Penhale", "23", 0, -15, [], {
    change: "workplacePlanned",
    example: "clock-on-utc",
    installer: "sole",
  }),
];
