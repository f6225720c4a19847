import { contains } from '../base/span';
import type { Assessment } from './assess';
import { goalSyntaxOf } from './goalDiagnostics';

/** What the panel should let stand out while the cursor is at `offset`: a ladder's element, or a goal by its index. */
export function elementAt({ description, model }: Assessment, offset: number): { elementId: string | null; goalId: number | null } {
  const element = description.syntax.ladder?.elements.find((entry) => contains(entry.span, offset)) ?? null;
  const goals = model.problem?.goals ?? [];
  const goalId = goals.findIndex((goal) => {
    const syntax = goalSyntaxOf(description, goal);
    return syntax !== null && contains(syntax.span, offset);
  });
  return { elementId: element?.name.value ?? null, goalId: goalId < 0 ? null : goalId };
}
