// A tag code: typed from the tag, or read from its QR by the camera.
import { ScanLine } from 'lucide-react';
import { useState } from 'react';
import { useController, type Control, type FieldPathByValue, type FieldValues } from 'react-hook-form';
import { Button } from '../../ui/button';
import { TextInput } from '../../ui/form/text-input';
import { CameraDialog } from './camera-dialog';

interface TagFieldProps<Values extends FieldValues, Output> {
  readonly control: Control<Values, unknown, Output>;
  readonly name: FieldPathByValue<Values, string | undefined>;
  readonly label: string;
}

export function TagField<Values extends FieldValues, Output>(props: TagFieldProps<Values, Output>) {
  const { control, name, label } = props;
  const { field, fieldState } = useController({ control, name });
  const [scanning, setScanning] = useState(false);
  return (
    <div className="grid gap-10">
      <TextInput
        code
        label={label}
        hint="Nine characters, such as AB12-CD34-E, or scan its QR."
        error={fieldState.error?.message}
        {...field}
        value={field.value ?? ''}
      />
      <Button icon={ScanLine} onClick={() => setScanning(true)}>
        Scan with the camera
      </Button>
      {scanning && (
        <CameraDialog
          onClose={() => setScanning(false)}
          onRead={(text) => {
            field.onChange(text);
            setScanning(false);
          }}
        />
      )}
    </div>
  );
}
