import { zodResolver } from '@hookform/resolvers/zod';
import { Controller, useForm } from 'react-hook-form';
import { courseGroups } from '../../../../shared/gallery/course';
import { Button } from '../../../components/button';
import { Dialog } from '../../../components/dialog';
import { FieldFrame } from '../../../components/field-frame';
import { Notice } from '../../../components/notice';
import { Segments } from '../../../components/segments';
import { SelectField } from '../../../components/select-field';
import { TextArea, TextField } from '../../../components/text-field';
import { stripDetailsSchema, type StripDetails, type StripDetailsInput } from '../state/strip-details';

interface DetailsDialogProps {
  title: string;
  action: string;
  initial: StripDetailsInput;
  /** Only the owner decides who sees a strip. */
  visibilityFixed: boolean;
  busy: boolean;
  error: string | null;
  onSave(details: StripDetails): void;
  onClose(): void;
}

const noGroup = 'none';
const groupOptions = [
  { value: noGroup as string, label: 'Not in the course' },
  ...courseGroups.map((group) => ({ value: group.id as string, label: group.title })),
];

/** Title, teaching point, tags, place in the course, who sees it. */
export function DetailsDialog(props: DetailsDialogProps) {
  const { register, control, handleSubmit, formState } = useForm<StripDetailsInput, unknown, StripDetails>({
    resolver: zodResolver(stripDetailsSchema),
    defaultValues: props.initial,
  });
  const errorOf = (name: keyof StripDetailsInput): string | undefined => formState.errors[name]?.message;
  return (
    <Dialog open title={props.title} onClose={props.onClose}>
      <form
        className="mt-4 flex flex-col gap-4"
        noValidate
        onSubmit={(event) => void handleSubmit(props.onSave)(event)}
      >
        {props.error && (
          <Notice kind="red" title="Not saved.">
            {props.error}
          </Notice>
        )}
        <TextField
          label="Title"
          autoComplete="off"
          error={errorOf('title') && 'Give a title of 1 to 120 characters.'}
          {...register('title')}
        />
        <TextArea
          label="Teaching point"
          help="What a learner should see, in one or two sentences."
          error={errorOf('teachingPoint') && 'At most 500 characters.'}
          {...register('teachingPoint')}
        />
        <TextField
          label="Tags"
          help="Words with commas between, at most 12."
          autoComplete="off"
          error={errorOf('tagWords')}
          {...register('tagWords')}
        />
        <Controller
          control={control}
          name="group"
          render={({ field }) => (
            <FieldFrame label="Place in the course">
              <SelectField
                label="Place in the course"
                value={(field.value ?? noGroup) as string}
                options={groupOptions}
                onChange={(value) => field.onChange(value === noGroup ? null : value)}
              />
            </FieldFrame>
          )}
        />
        {!props.visibilityFixed && (
          <Controller
            control={control}
            name="visibility"
            render={({ field }) => (
              <FieldFrame label="Who sees it">
                <Segments
                  label="Who sees it"
                  value={field.value ?? 'private'}
                  options={[
                    { value: 'private', label: 'Only me' },
                    { value: 'department', label: 'My department' },
                  ]}
                  onChange={field.onChange}
                />
              </FieldFrame>
            )}
          />
        )}
        <div className="flex justify-end gap-2.5">
          <Button onClick={props.onClose}>Cancel</Button>
          <Button kind="primary" type="submit" disabled={props.busy}>
            {props.busy ? 'Saving …' : props.action}
          </Button>
        </div>
      </form>
    </Dialog>
  );
}
