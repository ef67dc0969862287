import { useParams } from 'react-router';
import { PartSheet } from '../../features/parts/components/part-sheet.tsx';

export default function Mount() {
  const { id = '' } = useParams();
  return <PartSheet table="mounts" id={id} kind="mount" about={({ kind }) => kind.replaceAll('-', ' ')} />;
}
