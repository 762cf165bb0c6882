import type { Assessment } from "@/lib/notify/assessment";
import type { Job } from "@/lib/notify/job";
import { documentsIn } from "@/lib/notify/pack";
import { demandDayFigure, demandFigure } from "./demand-figures";
import { singleLineSheets } from "./drawings/single-line";
import type { Drawing } from "./drawings/svg";
import { operatorName } from "./issue";
import { touchVoltageFigure } from "./open-pen-figures";
import { weekFigures } from "./week-figures";

export type NamedDrawing = { name: string; title: string; drawing: Drawing };

/** Every drawing of a pack as a file of its own. A pack without the document has no drawing of it either. */
export function drawingsOf(job: Job, assessment: Assessment): NamedDrawing[] {
  const documents = documentsIn(job, assessment);
  return [
    ...(documents.includes("02-earthing-and-open-pen") ? earthing(job, assessment) : []),
    ...(documents.includes("03-smart-charging-settings") ? weeks(job) : []),
    ...(documents.includes("04-demand-and-circuit") ? demand(job, assessment) : []),
  ];
}

function earthing(job: Job, assessment: Assessment): NamedDrawing[] {
  const sheets = singleLineSheets(job, operatorName(assessment));
  return [
    ...sheets.map((drawing, index) => ({
      name: sheets.length > 1 ? `drawings/single-line-${index + 1}.svg` : "drawings/single-line.svg",
      title: sheets.length > 1 ? `Single-line diagram, sheet ${index + 1}` : "Single-line diagram",
      drawing,
    })),
    ...assessment.openPen.flatMap((result) => {
      const drawing = touchVoltageFigure(job, assessment, result);
      return drawing
        ? [
            {
              name: `drawings/touch-voltage-${result.chargepoint}.svg`,
              title: `Touch voltage, ${result.chargepoint}`,
              drawing,
            },
          ]
        : [];
    }),
  ];
}

const weeks = (job: Job): NamedDrawing[] =>
  job.chargepoints.flatMap((unit) => {
    const windows = unit.smartCharging.factoryDefault;
    if (!windows?.length) return [];
    return weekFigures(job, unit, windows).map(({ season, drawing }) => {
      const part = season === "all year" ? "" : `-${season.split(" ")[0]}`;
      return {
        name: `drawings/week-${unit.id}${part}.svg`,
        title: `Week of default hours, ${unit.id}${season === "all year" ? "" : `, ${season}`}`,
        drawing,
      };
    });
  });

function demand(job: Job, assessment: Assessment): NamedDrawing[] {
  const phases = demandFigure(job, assessment);
  const day = demandDayFigure(job, assessment);
  return [
    ...(phases ? [{ name: "drawings/demand.svg", title: "Demand before and after", drawing: phases }] : []),
    ...(day ? [{ name: "drawings/demand-day.svg", title: "Demand through the day", drawing: day }] : []),
  ];
}
