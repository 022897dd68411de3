import { X } from 'lucide-react';
import { useState, type FormEvent, type JSX } from 'react';

import type { LatticeSummary } from '#common/schemas/lattice';
import { Button } from '#client/components/button.tsx';
import { Dialog } from '#client/components/dialog.tsx';
import { InlineError } from '#client/components/error-state.tsx';
import { TextField } from '#client/components/text-field.tsx';
import { useUpdateLattice } from '#client/features/shelf/api/change-lattice.ts';
import { mergeTags, tagLimits } from '#client/features/shelf/tags.ts';

interface TagsDialogProps {
  lattice: LatticeSummary;
  workspace: string;
  open: boolean;
  onClose: () => void;
}

function TagList({
  tags,
  onRemove,
}: {
  tags: readonly string[];
  onRemove: (tag: string) => void;
}): JSX.Element {
  return (
    <ul aria-label="Tags" className="flex min-h-8 flex-wrap gap-2">
      {tags.length === 0 && <li className="text-soft">No tags yet.</li>}
      {tags.map((tag) => (
        <li
          key={tag}
          className="flex h-8 items-center gap-1 rounded-control border border-line bg-paper pr-1 pl-2.5"
        >
          {tag}
          <button
            type="button"
            aria-label={`Remove the tag ${tag}`}
            onClick={() => onRemove(tag)}
            className="grid size-6 place-items-center rounded-control text-soft hover:bg-wash hover:text-ink"
          >
            <X aria-hidden className="size-3.5" />
          </button>
        </li>
      ))}
    </ul>
  );
}

function TagsForm({ lattice, workspace, onClose }: Omit<TagsDialogProps, 'open'>): JSX.Element {
  const update = useUpdateLattice(workspace, lattice.id);
  const [tags, setTags] = useState<readonly string[]>(lattice.tags);
  const [typed, setTyped] = useState('');
  const [problem, setProblem] = useState<string | null>(null);

  const add = (): readonly string[] | null => {
    const merged = mergeTags(tags, typed);
    setProblem(merged.problem);
    if (merged.problem !== null) {
      return null;
    }
    setTags(merged.tags);
    setTyped('');
    return merged.tags;
  };
  const save = (): void => {
    const all = add();
    if (all !== null) {
      update.mutate({ tags: [...all] }, { onSuccess: onClose });
    }
  };
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    add();
  };
  return (
    <>
      <InlineError error={update.error} className="mb-4" />
      <TagList tags={tags} onRemove={(tag) => setTags(tags.filter((one) => one !== tag))} />
      <form className="mt-4 flex items-start gap-2" onSubmit={submit}>
        <TextField
          label="Another tag"
          data-autofocus
          className="grow"
          value={typed}
          maxLength={tagLimits.length * 3}
          onChange={(event) => setTyped(event.target.value)}
          error={problem}
          hint="Several at once with commas between."
        />
        <Button type="submit" className="mt-[22px]" disabled={typed.trim() === ''}>
          Add
        </Button>
      </form>
      <div className="mt-6 flex justify-end gap-2">
        <Button onClick={onClose}>Cancel</Button>
        <Button variant="primary" onClick={save} isBusy={update.isPending}>
          Save the tags
        </Button>
      </div>
    </>
  );
}

/** Puts tags on a lattice and takes them off. */
export function TagsDialog({ open, onClose, ...rest }: TagsDialogProps): JSX.Element {
  return (
    <Dialog open={open} onClose={onClose} title={`Tags of ${rest.lattice.name}`}>
      <TagsForm {...rest} onClose={onClose} />
    </Dialog>
  );
}
