// The receiving desk: the core's tag, the checks, and the sums that follow from them.
import { useState } from 'react';
import { ACTION_INPUT } from '../../../shared/orders/actions';
import { actionEndpoints, type Order } from '../../../shared/orders/contract';
import { formatCents } from '../../../shared/kernel/money';
import type { FieldError } from '../../../shared/kernel/problem';
import type { ListingPage } from '../../../shared/listings/page';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { ErrorSummary } from '../../ui/form/error-summary';
import { TextArea } from '../../ui/form/text-area';
import { SectionHead } from '../../ui/sheet';
import { ConfirmAction } from '../actions/confirm-action';
import { useOrderAction } from '../api';
import { Cautions } from '../cautions';
import { newestOf, photosFor } from '../photos/order-photos';
import { PendingPhotos } from '../photos/pending-photos';
import { usePhotoUploads } from '../photos/use-photo-uploads';
import { deskChecks, deskResult } from '../view/desk-checks';
import { CAUTIONS } from '../view/next-step';
import { CoreSide } from './core-tag';
import { checkName, DeskCheckRow } from './desk-check-row';
import { deskFaults, gradeInput } from './desk-form';
import { DeskSums, gradeWords } from './desk-sums';
import { useDeskDraft } from './use-desk-draft';

interface GradeDeskProps {
  readonly order: Order;
  readonly unit: ListingPage | null;
}

function NoteDialog(props: { note: string; onNote: (note: string) => void; onClose: () => void }) {
  const { note, onNote, onClose } = props;
  return (
    <Dialog
      open
      onClose={onClose}
      title="Not what the terms cover"
      description="Only what stands in the terms may be taken off. Write what else you saw; the builder reads it, and an admin if it comes to a case."
      actions={
        <Button look="ink" size="big" onClick={onClose}>
          Keep the note
        </Button>
      }
    >
      <TextArea
        label="What you saw"
        value={note}
        maxLength={1000}
        onChange={(event) => onNote(event.target.value)}
      />
    </Dialog>
  );
}

/** Everything the desk remembers and decides while a core is graded. */
function useGradeDesk({ order, unit }: GradeDeskProps) {
  const kind = unit?.kind ?? null;
  const draft = useDeskDraft(order.id);
  const uploads = usePhotoUploads(order.id, 'grade');
  const action = useOrderAction(actionEndpoints.grade, order.id);
  const [note, setNote] = useState('');
  const [open, setOpen] = useState<'note' | 'confirm' | null>(null);
  const [faults, setFaults] = useState<readonly FieldError[]>([]);
  const [attempt, setAttempt] = useState(0);
  const photos = photosFor(order, 'grade');
  const photoOf = (code: string) => newestOf(photos, code);
  const { schedule } = order;
  const result = deskResult({
    kind,
    schedule,
    depositCents: order.money.depositCents,
    answers: draft.answers,
  });
  return {
    ...{ draft, uploads, note, setNote, open, setOpen, faults, attempt, photoOf, result },
    checks: deskChecks(kind, schedule),
    grade: () => {
      const found = deskFaults(result, photoOf);
      setFaults(found);
      setAttempt(attempt + 1);
      if (found.length === 0) setOpen('confirm');
    },
    send: async () => {
      const input = ACTION_INPUT.grade.parse(gradeInput(order.version, result, photoOf, note));
      await action.mutateAsync(input);
      draft.forget();
    },
  };
}

type Desk = ReturnType<typeof useGradeDesk>;

function Checks({ desk }: { readonly desk: Desk }) {
  const { checks, draft, uploads, result, faults } = desk;
  return (
    <section aria-labelledby="desk-checks">
      <SectionHead
        id="desk-checks"
        title={`${checks.length} checks`}
        note="A “no” that costs money needs a photo."
      />
      <Cautions lines={CAUTIONS.grade ?? []} />
      <ErrorSummary errors={faults} stops="this grade" attempt={desk.attempt} />
      <ol>
        {checks.map((check, index) => (
          <DeskCheckRow
            key={check.code}
            number={index + 1}
            check={check}
            answer={draft.answers[check.code] ?? null}
            onAnswer={(given) => draft.answer(check.code, given)}
            photo={desk.photoOf(check.code)}
            uploading={uploads.pending.some((one) => one.shot === check.code)}
            onPhoto={(file) => uploads.add([file], check.code)}
            error={faults.find((one) => one.path === checkName(check.code))?.message}
          />
        ))}
      </ol>
      <div className="mt-14 grid gap-14">
        <PendingPhotos uploads={uploads} />
        {result.open.length > 0 && result.open.length < checks.length && (
          <Button size="big" full onClick={() => draft.restIsWell(checks.map((check) => check.code))}>
            The other {result.open.length}: yes
          </Button>
        )}
      </div>
    </section>
  );
}

export function GradeDesk({ order, unit }: GradeDeskProps) {
  const desk = useGradeDesk({ order, unit });
  const { result, open, setOpen } = desk;
  return (
    <div className="desk">
      <CoreSide order={order} unit={unit} />
      <Checks desk={desk} />
      <DeskSums order={order} result={result} onGrade={desk.grade} onNote={() => setOpen('note')} />
      {open === 'note' && <NoteDialog note={desk.note} onNote={desk.setNote} onClose={() => setOpen(null)} />}
      {open === 'confirm' && (
        <ConfirmAction
          onClose={() => setOpen(null)}
          title={`Grade ${result.grade}: ${formatCents(result.toBuilderCents)} back to ${order.builderName}?`}
          description={`${formatCents(result.toSellerCents)} comes to ${order.sellerName}. ${order.builderName} has 3 business days to disagree; after that the money moves and cannot be called back. The grade itself cannot be changed.`}
          confirmWords={gradeWords(result)}
          onConfirm={desk.send}
        />
      )}
    </div>
  );
}
