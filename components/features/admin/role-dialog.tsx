import { useState } from 'react';
import { useQueryClient } from '@tanstack/react-query';
import { useChangeRole } from '@/components/api/people';
import { ApiProblem } from '@/components/api/problem';
import { FormFailure } from '@/components/features/account/form-failure';
import { roleWords } from '@/components/features/account/role-words';
import { useAnnouncer } from '@/components/ui/announcer';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { Text } from '@/components/ui/text';
import type { PersonRow } from '@/shared/api/people';
import { rolesInPowerOf, type Role } from '@/shared/standing';

type RoleDialogProps = { person: PersonRow; by: Role; onClose: () => void };

/** Gives a person another role. */
export function RoleDialog({ person, by, onClose }: RoleDialogProps) {
  const [role, setRole] = useState<Role>(person.role);
  const queryClient = useQueryClient();
  const { toast } = useAnnouncer();
  const change = useChangeRole();
  const save = () =>
    change.mutate(
      { person, role },
      {
        onSuccess: (changed) => {
          toast({ text: `${changed.name} is ${changed.role} now.`, kind: 'good' });
          onClose();
        },
        onError: (error) => {
          // Somebody else changed this person meanwhile: show what holds now behind the dialog.
          if (error instanceof ApiProblem && error.code === 'version-conflict') {
            void queryClient.invalidateQueries({ queryKey: ['people'] });
          }
        },
      },
    );
  return (
    <Dialog
      open
      title={`Role of ${person.name}`}
      onClose={onClose}
      closeLabel="Cancel"
      actions={
        <Button
          kind="primary"
          label="Set the role"
          disabled={role === person.role}
          busy={change.isPending}
          busyLabel="Saving…"
          onPress={save}
        />
      }
    >
      <SegmentedControl
        label="Role"
        options={rolesInPowerOf[by].map((value) => ({ value, label: value }))}
        value={role}
        onChange={setRole}
      />
      <Text tone="soft">{roleWords[role]}</Text>
      <FormFailure failure={change.error} />
    </Dialog>
  );
}
