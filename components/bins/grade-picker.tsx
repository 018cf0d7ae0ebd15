"use client";

import { useState } from "react";
import { GradeTag } from "@/components/ui/tag";

export type GradeChoice = { id: string; name: string; family: string };

const SHOWN = 5;

/** Grades as large tags, last used first; the rest behind one button. */
export function GradePicker({ grades, chosen, onChoose }: { grades: GradeChoice[]; chosen: string; onChoose: (id: string) => void }) {
  const [all, setAll] = useState(grades.length <= SHOWN + 1);
  const near = grades.slice(0, SHOWN);
  const shown = all ? grades : near.some((grade) => grade.id === chosen) ? near : [...near.slice(0, -1), ...grades.filter((grade) => grade.id === chosen)];
  return (
    <fieldset className="grades">
      <legend>
        <span className="wide">Grade</span> <span>last used first</span>
      </legend>
      <div className="tags">
        {shown.map((grade) => (
          <GradeTag
            key={grade.id}
            as="button"
            size="lg"
            family={grade.family}
            name={grade.name}
            pressed={grade.id === chosen}
            onClick={() => onChoose(grade.id)}
          />
        ))}
        {all ? null : (
          <button type="button" className="chip" onClick={() => setAll(true)}>
            More grades
          </button>
        )}
      </div>
    </fieldset>
  );
}
