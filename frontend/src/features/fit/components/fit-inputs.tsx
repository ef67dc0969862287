import { BoatInputs } from './boat-inputs.tsx';
import type { InputsProps } from './inputs-props.ts';
import { MotorInputs } from './motor-inputs.tsx';
import { PlaceInputs, SensorInputs } from './sensor-inputs.tsx';
import { SpeedInputs } from './speed-inputs.tsx';

/** Everything that can be set, folded by subject. There is nothing to send: each change is answered as it is made. */
export function FitInputs(props: InputsProps) {
  return (
    <form aria-label="What is checked" onSubmit={(event) => event.preventDefault()}>
      <BoatInputs {...props} />
      <MotorInputs {...props} />
      <PlaceInputs {...props} />
      <SensorInputs {...props} />
      <SpeedInputs {...props} />
    </form>
  );
}
