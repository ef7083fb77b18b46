import { type TrendFile } from '@tailrace/shared/contracts/trends';
import { type TrendFileEntity } from './trend-file.entity.js';

export function presentTrendFile(file: TrendFileEntity): TrendFile {
  const { id, number, name, size, sha256, area, state, plan, report, refusal } = file;
  return {
    id,
    number,
    name,
    size,
    sha256,
    area: { id: area.id, code: area.code, name: area.name },
    receivedBy: file.receivedByName,
    receivedAt: new Date(file.receivedAt).toISOString(),
    state,
    progress: { share: file.share, rows: file.rows },
    plan,
    report,
    refusal,
  };
}
