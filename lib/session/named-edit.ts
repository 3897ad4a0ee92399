import type { Edit } from '@/lib/casefile/edit';

/** A finished edit with the name that undo gives it. */
export interface NamedEdit {
  label: string;
  edit: Edit;
}
