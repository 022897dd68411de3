import type { OwnDataValue } from '#common/schemas/data-values';
import type { DataValue } from '#common/schemas/energetics';
import { useToast } from '#client/components/toast.tsx';
import {
  useRestoreDataValue,
  useSetDataValue,
} from '#client/features/data-values/api/data-values.ts';
import { messageOf } from '#client/lib/api-error.ts';

interface DataValueChanges {
  /** Writes a value over the earlier one of the workspace, if there is one. */
  set: (value: DataValue, earlier: OwnDataValue | null, onDone: () => void) => void;
  /** Goes back to the shipped value. */
  restore: (own: OwnDataValue, onDone: () => void) => void;
  isBusy: boolean;
  error: unknown;
}

/** Changes of the workspace's own values, each with a way back. */
export function useDataValueChanges(workspace: string): DataValueChanges {
  const show = useToast();
  const put = useSetDataValue(workspace);
  const remove = useRestoreDataValue(workspace);
  const fail = (error: unknown): void => show({ message: messageOf(error), tone: 'failure' });
  const putBack = ({ key, value, note }: OwnDataValue): void =>
    put.mutate({ key, value, note }, { onError: fail });
  return {
    set: (value, earlier, onDone) =>
      put.mutate(value, {
        onSuccess: () => {
          const undo = (): void =>
            earlier === null
              ? remove.mutate({ key: value.key }, { onError: fail })
              : putBack(earlier);
          show({
            message: 'Our value counts from now on',
            action: { label: 'Undo', onAction: undo },
          });
          onDone();
        },
      }),
    restore: (own, onDone) =>
      remove.mutate(own, {
        onSuccess: () => {
          const undo = { label: 'Undo', onAction: () => putBack(own) };
          show({ message: 'Our value is taken back', action: undo });
          onDone();
        },
      }),
    isBusy: put.isPending || remove.isPending,
    error: put.error ?? remove.error,
  };
}
