// Changes what a member may do, from the next request on.
import { z } from 'zod';
import { duties } from '../../../shared/accounts/fields';
import type { Duty } from '../../../shared/accounts/actor';
import type { Team } from '../../../shared/accounts/seller-contract';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { Form, useZodForm } from '../../ui/form/form';
import { sayDone } from '../../ui/notices';
import { useTeamChanges } from '../api';
import { DutiesField } from './duties-field';

const schema = z.strictObject({ duties });

interface DutiesDialogProps {
  readonly sellerId: string;
  readonly member: Team['members'][number];
  readonly onClose: () => void;
}

export function DutiesDialog({ sellerId, member, onClose }: DutiesDialogProps) {
  const form = useZodForm(schema, { duties: [...member.duties] });
  const { setDuties } = useTeamChanges(sellerId);
  const { errors, isSubmitting } = form.formState;
  async function submit(values: { duties: Duty[] }) {
    await setDuties.mutateAsync({ userId: member.userId, duties: values.duties });
    sayDone(`${member.name} has other duties now`);
    onClose();
  }
  return (
    <Dialog open onClose={onClose} title={`Duties of ${member.name}`}>
      <Form form={form} onSubmit={submit} stops="the duties">
        <DutiesField registered={form.register('duties')} error={errors.duties?.message} />
        <div className="dialog-actions">
          <Button type="submit" look="ink" size="big" busy={isSubmitting} busyWords="Saving">
            Save the duties
          </Button>
          <Button size="big" onClick={onClose}>
            Go back
          </Button>
        </div>
      </Form>
    </Dialog>
  );
}
