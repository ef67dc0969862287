import { useParams } from 'react-router';
import { ButtonLink } from '../../components/ui/button.tsx';
import { HullDrawings } from '../../features/hulls/components/hull-drawings.tsx';
import { RunningTrim } from '../../features/hulls/components/running-trim.tsx';
import { PartSheet, Section } from '../../features/parts/components/part-sheet.tsx';
import { hullFormWords } from '../../lib/form-words.ts';
import { formatQuantity } from '../../lib/format-units.ts';
import { paths } from '../../lib/paths.ts';
import { useUnits } from '../../lib/unit-choice.ts';

export default function Hull() {
  const { id = '' } = useParams();
  const units = useUnits();
  return (
    <PartSheet
      table="hulls"
      id={id}
      kind="boat"
      about={({ form, lengthM, material }) =>
        [hullFormWords(form), formatQuantity(lengthM, 'lengthM', units), material?.replaceAll('-', ' ')].filter(Boolean).join(' · ')
      }
      action={(sheet) => (
        <p>
          <ButtonLink kind="main" to={paths.fitForHull(sheet.id)}>
            Check a fit
          </ButtonLink>
        </p>
      )}
    >
      {(sheet) => (
        <>
          <Section title="At the transom">
            <HullDrawings hull={sheet} />
          </Section>
          <Section title="Running trim">
            <RunningTrim hull={sheet} />
          </Section>
        </>
      )}
    </PartSheet>
  );
}
