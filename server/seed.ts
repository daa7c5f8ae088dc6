import { openHouse, runProgram } from './opened-house';
import { seedSteps } from './seed-steps';

void runProgram(async () => {
  const { house, config, close } = await openHouse(process.env);
  try {
    if (!config.demoMode || config.demoPassword === null) throw new Error('Demo data is for demo mode: set SLANTWISE_DEMO=on and SLANTWISE_DEMO_PASSWORD.');
    for (const step of seedSteps) {
      await step.run(house);
      house.ground.logger.info({ step: step.name }, 'demo data is there');
    }
  } finally {
    await close();
  }
});
