import { type EngineCommand } from '@/server/engine/commands/engine-command';
import { forecastCommand } from '@/server/engine/commands/forecast-command';
import { impliedCommand } from '@/server/engine/commands/implied-command';
import { lotsCommand } from '@/server/engine/commands/lots-command';
import { oddsCommand } from '@/server/engine/commands/odds-command';
import { priceCommand } from '@/server/engine/commands/price-command';
import { scoreCommand } from '@/server/engine/commands/score-command';
import { sessionsCommand } from '@/server/engine/commands/sessions-command';
import { symbolCommand } from '@/server/engine/commands/symbol-command';
import { volatilityCommand } from '@/server/engine/commands/volatility-command';
import { type EngineCommandName } from '@/shared/engine/engine-endpoints';

const commands: Readonly<Record<EngineCommandName, EngineCommand>> = {
  price: priceCommand,
  implied: impliedCommand,
  volatility: volatilityCommand,
  odds: oddsCommand,
  forecast: forecastCommand,
  symbol: symbolCommand,
  sessions: sessionsCommand,
  lots: lotsCommand,
  score: scoreCommand,
};

/** What the headless engine answers, by name. */
export const engineCommands: ReadonlyMap<string, EngineCommand> = new Map(Object.entries(commands));
