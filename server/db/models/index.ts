/** All models, bound to a connection by `initModels`. Only repositories use them. */
import type { Sequelize } from 'sequelize';
import { initPracticeModel } from './practice-model.ts';
import { initUserModel } from './user-model.ts';
import { initMembershipModel } from './membership-model.ts';
import { initHouseholdModel } from './household-model.ts';
import { initAccountTokenModel } from './account-token-model.ts';
import { initAreaModel } from './area-model.ts';
import { initBoxModel } from './box-model.ts';
import { initScanModel } from './scan-model.ts';
import { initPageModel } from './page-model.ts';
import { initSubjectModel } from './subject-model.ts';
import { initFilingModel } from './filing-model.ts';
import { initPaperModel } from './paper-model.ts';
import { initPaperChangeModel } from './paper-change-model.ts';
import { initHoldModel } from './hold-model.ts';
import { initShredListModel } from './shred-list-model.ts';
import { initShredRowModel } from './shred-row-model.ts';
import { initDepartureModel } from './departure-model.ts';
import { initReminderModel } from './reminder-model.ts';
import { initMailModel } from './mail-model.ts';
import { initEventModel } from './event-model.ts';

export function initModels(sequelize: Sequelize): void {
  initPracticeModel(sequelize);
  initUserModel(sequelize);
  initMembershipModel(sequelize);
  initHouseholdModel(sequelize);
  initAccountTokenModel(sequelize);
  initAreaModel(sequelize);
  initBoxModel(sequelize);
  initScanModel(sequelize);
  initPageModel(sequelize);
  initSubjectModel(sequelize);
  initFilingModel(sequelize);
  initPaperModel(sequelize);
  initPaperChangeModel(sequelize);
  initHoldModel(sequelize);
  initShredListModel(sequelize);
  initShredRowModel(sequelize);
  initDepartureModel(sequelize);
  initReminderModel(sequelize);
  initMailModel(sequelize);
  initEventModel(sequelize);
}
