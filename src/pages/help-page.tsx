import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { paths } from '../lib/paths';

function Section({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section className="mt-8">
      <h2 className="text-lead font-semibold">{title}</h2>
      <div className="mt-2 flex flex-col gap-3 text-section text-ink-2">{children}</div>
    </section>
  );
}

export function Component() {
  return (
    <main className="mx-auto w-full max-w-3xl px-4 py-9 tablet:px-6">
      <h1 className="text-title font-semibold tracking-[-0.012em]">How Paceloom works</h1>
      <p className="mt-3 text-section text-ink-2">
        A strip here is made, not recorded. A patient’s conduction system and a pacemaker run as cause and
        effect; their events decide where and when the heart is activated; the activation decides all twelve
        leads; a recorder limits the bandwidth. So what is true of every beat is known before it is drawn.
      </p>
      <Section title="What you see on a paced strip">
        <p>
          <strong className="text-ink">Stimulus or pacing spike.</strong> A pulse of a few tenths of a
          millisecond. Bipolar leads leave a small spike, unipolar ones a large one, because the current
          returns through the body. By common practice the ventricular spike is larger than the atrial one.
        </p>
        <p>
          <strong className="text-ink">Capture.</strong> The stimulus starts a depolarization. It needs enough
          output for its pulse width (the strength–duration curve) and muscle that is not refractory. A spike
          alone proves nothing: look for what follows it, and feel for the pulse.
        </p>
        <p>
          <strong className="text-ink">Wide QRS and discordance.</strong> A wave that starts in muscle is
          slow, so the QRS is wide; the last to depolarize recover last, so T points the other way.
        </p>
        <p>
          <strong className="text-ink">Fusion and pseudofusion.</strong> A paced and a conducted wave can
          share a beat. When the stimulus comes too late to change anything, the beat is pseudofusion.
        </p>
      </Section>
      <Section title="The ladder">
        <p>
          Three lanes in the order of the impulse: atria, AV junction, ventricles. A copper stroke from
          outside is a stimulus; a copper dot on the lane is capture, a ring with a bar is none. Ink dots are
          the heart’s own beats, filled diamonds escapes. Lines are conduction, upwards when it is retrograde;
          two bars end a blocked impulse; a hollow diamond is fusion, facing bars are impulses that meet
          without it.
        </p>
        <p>
          Sensing windows show when the pacemaker listens: dotted where it acts on what it hears, hatched
          where it only notes it, closely hatched where it is deaf.
        </p>
      </Section>
      <Section title="Finding a threshold">
        <p>
          Turn the output down until capture is lost, and up until it is regained. With chest pads the
          artefact can hide a QRS or look like one: confirm capture with a pulse. Which output to leave is for
          local protocols and licensed practice.
        </p>
      </Section>
      <Section title="Infarct in paced rhythm">
        <p>
          An injured territory changes ST in every beat that crosses it. In wide beats the reading gives the
          Sgarbossa points, the modified rule with its ST/S ratio and the Barcelona rule, each with figure,
          limit, leads and source; in narrow beats, ST elevation in leads beside each other. ST is read 20 ms
          after the QRS.
        </p>
        <p>
          Criteria support a suspicion. A strip that meets none of them rules nothing out, and one that meets
          them is not a diagnosis: local practice decides.
        </p>
      </Section>
      <Section title="What bandwidth does">
        <p>
          A 0.4 ms spike holds little below 150 Hz. A diagnostic recorder (0.05–150 Hz) leaves about a seventh
          of its height, a monitor (0.5–40 Hz) about a twenty-fifth: the spike you look for may not be on the
          screen. The 0.5 Hz limit also shifts the ST segment. Compare two bandwidths in the editor, or two to
          four settings on the{' '}
          <Link to={paths.recorder()} className="text-teal-dark underline">
            recorder bench
          </Link>
          , which measures what each does and holds it against the published standards.
        </p>
        <p>
          <strong className="text-ink">Stimulus marker.</strong> Because bandwidth takes spikes away,
          recorders can look for them in the signal before the band-limit and mark what they find. So does
          ours, on a line of its own and never in the trace. A mark is a finding, not the truth: it can be
          missing, and interference can set it off. The bench shows how often.
        </p>
      </Section>
      <Section title="In the editor">
        <p>
          The groups follow the impulse: patient, pacing, leads and capture, waveform, disturbance, recorder.
          Drag a ruler or type a value, also with a unit (“1.2 s”, “800 uV”); for rates an interval will do.
          Only what acts on this strip is shown. Arrow keys on the strip walk the beats, in the ladder and the
          reading too. With the calipers, a third mark repeats the measured interval. Ctrl Z undoes, Ctrl S
          saves.
        </p>
      </Section>
      <Section title="Files">
        <p>
          Download, under More in the editor, makes files of the strip as it stands: numbers, pictures,
          standard recordings. Several come as one archive with a manifest. Long recordings are made in the
          background and wait under Exports for a week; remarks beside them say what a format could not hold.
          WAV files are for isolated, attenuated simulator inputs only.
        </p>
        <p>
          A preset file carries strips to another library: titles, teaching points, tags, place in the course,
          parameters and the engine they were saved with, never whose they are. Importing it first shows what
          is new and what is here already, and asks whether to skip, keep both or replace.
        </p>
      </Section>
      <Section title="Cautions">
        <p>
          For education only; not for diagnosis, monitoring, device programming or treatment. Follow local
          protocols, the manufacturer’s instructions and licensed practice. The heart model is one dipole in a
          uniform body: it teaches patterns, it does not predict a patient.
        </p>
      </Section>
      <Section title="Sources">
        <ul className="list-disc pl-5">
          <li>
            Bandwidth and its tests: IEC 60601-2-25:2011; Kligfield et al. 2007, AHA/ACC/HRS recommendations,
            part I.
          </li>
          <li>NBG code: Bernstein et al. 2002.</li>
          <li>
            Leads: Dower et al. 1980, Clin Cardiol 3:87; Edenbrandt and Pahlm 1988, J Electrocardiol 21:361.
          </li>
          <li>Bundle branch block criteria: Surawicz et al. 2009, AHA/ACCF/HRS recommendations, part III.</li>
          <li>
            Infarct in a wide QRS: Sgarbossa et al. 1996; Smith et al. 2012; Meyers et al. 2015; Di Marco et
            al. 2020.
          </li>
          <li>Paced QRS width: Alhous et al. 2011, Europace 13:1738; Gupta et al. 2018, IPEJ 18:210.</li>
          <li>Spike directions: Koenig et al. 2011, J Electrocardiol.</li>
        </ul>
      </Section>
    </main>
  );
}
