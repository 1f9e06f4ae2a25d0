import type { MigrationInterface, QueryRunner } from 'typeorm'

export class TheWholeJob1796139671193 implements MigrationInterface {
  name = 'TheWholeJob1796139671193'

  async up(queryRunner: QueryRunner): Promise<void> {
    // A rebuilt table takes its old name again; what refers to it must not be rewritten meanwhile.
    await queryRunner.query('PRAGMA legacy_alter_table = ON')
    await queryRunner.query(`DROP INDEX "IDX_4c5b2473c12c6c039e282b8079"`)
    await queryRunner.query(
      `CREATE TABLE "changes" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "kind" text NOT NULL, "rowId" varchar(36) NOT NULL, "action" text NOT NULL, "personId" varchar(36), "at" text NOT NULL, "batchId" varchar(36), "fields" text NOT NULL)`,
    )
    await queryRunner.query(`CREATE INDEX "IDX_d1846ad223eba024f4d843d55b" ON "changes" ("batchId") `)
    await queryRunner.query(`CREATE INDEX "IDX_6860b148cb8124b004d3052ea3" ON "changes" ("teamId", "at") `)
    await queryRunner.query(`CREATE INDEX "IDX_7a5db8fd1061dec279d359176b" ON "changes" ("rowId", "at") `)
    await queryRunner.query(
      `CREATE TABLE "copies" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "deletedAt" text, "sheetId" varchar(36) NOT NULL, "number" integer, "squadPlayerId" varchar(36), "way" text NOT NULL, "outAt" text, "backAt" text, "mailId" varchar(36))`,
    )
    await queryRunner.query(
      `CREATE UNIQUE INDEX "IDX_37e1cc613862a767f601c08eff" ON "copies" ("sheetId", "number") `,
    )
    await queryRunner.query(
      `CREATE TABLE "erasures" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "deletedAt" text, "kind" text NOT NULL, "subjectId" varchar(36) NOT NULL, "askedById" varchar(36), "dueAt" text NOT NULL, "stoppedAt" text, "stoppedById" varchar(36), "doneAt" text)`,
    )
    await queryRunner.query(`CREATE INDEX "IDX_6fb8e81d69311e7c5e57ed59c3" ON "erasures" ("dueAt") `)
    await queryRunner.query(`CREATE INDEX "IDX_e7dbe3dccca08919606f981b29" ON "erasures" ("teamId") `)
    await queryRunner.query(
      `CREATE TABLE "hand_ons" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "gameId" varchar(36) NOT NULL, "station" text NOT NULL, "fromId" varchar(36), "toId" varchar(36), "note" text NOT NULL DEFAULT (''), "at" text NOT NULL)`,
    )
    await queryRunner.query(`CREATE INDEX "IDX_d4f92c09c980f549db94241b6c" ON "hand_ons" ("teamId", "at") `)
    await queryRunner.query(`CREATE INDEX "IDX_8c99ea56cc137affd9526770cb" ON "hand_ons" ("gameId", "at") `)
    await queryRunner.query(
      `CREATE TABLE "invitations" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "deletedAt" text, "role" text NOT NULL, "squadPlayerId" varchar(36), "email" text, "tokenHash" text NOT NULL, "expiresAt" text NOT NULL, "invitedById" varchar(36), "usedAt" text, "usedById" varchar(36), "revokedAt" text)`,
    )
    await queryRunner.query(
      `CREATE UNIQUE INDEX "IDX_a6eb6f2543de8a5a4c148b32a1" ON "invitations" ("tokenHash") `,
    )
    await queryRunner.query(`CREATE INDEX "IDX_113cb1411bac0e764b922699d4" ON "invitations" ("teamId") `)
    await queryRunner.query(
      `CREATE TABLE "mails" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36), "kind" text NOT NULL, "onceKey" text NOT NULL, "aboutId" varchar(36), "recipient" text NOT NULL, "subject" text NOT NULL, "text" text NOT NULL, "html" text NOT NULL, "attachment" text, "state" text NOT NULL, "tries" integer NOT NULL DEFAULT (0), "nextTryAt" text, "trouble" text, "sentAt" text, "createdAt" text NOT NULL)`,
    )
    await queryRunner.query(`CREATE UNIQUE INDEX "IDX_bbdc05b09d5283dc0ddc2fc8eb" ON "mails" ("onceKey") `)
    await queryRunner.query(
      `CREATE INDEX "IDX_182b2632a42ce2d18955036a3f" ON "mails" ("state", "nextTryAt") `,
    )
    await queryRunner.query(
      `CREATE INDEX "IDX_35cb78fb93442d2da1e94d483e" ON "mails" ("teamId", "createdAt") `,
    )
    await queryRunner.query(
      `CREATE TABLE "openings" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "sheetId" varchar(36) NOT NULL, "personId" varchar(36) NOT NULL, "firstAt" text NOT NULL, "lastAt" text NOT NULL)`,
    )
    await queryRunner.query(
      `CREATE UNIQUE INDEX "IDX_75e0b6d0a4d5a2cdaf59edb20a" ON "openings" ("sheetId", "personId") `,
    )
    await queryRunner.query(
      `CREATE TABLE "opponent_players" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "deletedAt" text, "opponentId" varchar(36) NOT NULL, "jersey" integer NOT NULL, "does" text NOT NULL, "note" text NOT NULL DEFAULT (''))`,
    )
    await queryRunner.query(
      `CREATE UNIQUE INDEX "IDX_60cadb07d3b5225ef1ace353d6" ON "opponent_players" ("opponentId", "jersey") WHERE "deletedAt" IS NULL`,
    )
    await queryRunner.query(
      `CREATE TABLE "password_resets" ("id" varchar(36) PRIMARY KEY NOT NULL, "personId" varchar(36) NOT NULL, "tokenHash" text NOT NULL, "createdAt" text NOT NULL, "expiresAt" text NOT NULL, "usedAt" text)`,
    )
    await queryRunner.query(
      `CREATE INDEX "IDX_d7b6b606688f35879dc07d4278" ON "password_resets" ("personId") `,
    )
    await queryRunner.query(
      `CREATE UNIQUE INDEX "IDX_7f6aae0fcc807c9e7194ca5cc4" ON "password_resets" ("tokenHash") `,
    )
    await queryRunner.query(
      `CREATE TABLE "practices" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "deletedAt" text, "gameId" varchar(36) NOT NULL, "startsAt" text NOT NULL, "body" text NOT NULL)`,
    )
    await queryRunner.query(`CREATE INDEX "IDX_c467e402063162bfcfede4c7d6" ON "practices" ("gameId") `)
    await queryRunner.query(
      `CREATE INDEX "IDX_954b4a3770543d4daedbb693e3" ON "practices" ("teamId", "startsAt") `,
    )
    await queryRunner.query(
      `CREATE TABLE "practice_reps" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "practiceId" varchar(36) NOT NULL, "counterId" varchar(36) NOT NULL, "shape" text, "kind" text NOT NULL, "n" integer NOT NULL, "k" integer)`,
    )
    await queryRunner.query(
      `CREATE INDEX "IDX_3de04e9d6024588834a0179896" ON "practice_reps" ("teamId", "counterId") `,
    )
    await queryRunner.query(
      `CREATE INDEX "IDX_0b5136d56d15f10fe676f6d7c8" ON "practice_reps" ("practiceId") `,
    )
    await queryRunner.query(
      `CREATE TABLE "temporary_teams" ("id" varchar(36) PRIMARY KEY NOT NULL, "name" text NOT NULL, "squadName" text NOT NULL, "timeZone" text NOT NULL, "season" text NOT NULL, "rulePack" text NOT NULL, "createdAt" text NOT NULL, "settings" text, "version" integer NOT NULL DEFAULT (1))`,
    )
    await queryRunner.query(
      `INSERT INTO "temporary_teams"("id", "name", "squadName", "timeZone", "season", "rulePack", "createdAt") SELECT "id", "name", "squadName", "timeZone", "season", "rulePack", "createdAt" FROM "teams"`,
    )
    await queryRunner.query(`DROP TABLE "teams"`)
    await queryRunner.query(`ALTER TABLE "temporary_teams" RENAME TO "teams"`)
    await queryRunner.query(`DROP INDEX "IDX_5154c6f25ac30db892aa0ac449"`)
    await queryRunner.query(
      `CREATE TABLE "temporary_opponents" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "name" text NOT NULL, "shortName" text NOT NULL, "deletedAt" text, "notes" text NOT NULL DEFAULT (''), CONSTRAINT "FK_5154c6f25ac30db892aa0ac4498" FOREIGN KEY ("teamId") REFERENCES "teams" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "temporary_opponents"("id", "teamId", "version", "createdAt", "updatedAt", "name", "shortName") SELECT "id", "teamId", "version", "createdAt", "updatedAt", "name", "shortName" FROM "opponents"`,
    )
    await queryRunner.query(`DROP TABLE "opponents"`)
    await queryRunner.query(`ALTER TABLE "temporary_opponents" RENAME TO "opponents"`)
    await queryRunner.query(`CREATE INDEX "IDX_5154c6f25ac30db892aa0ac449" ON "opponents" ("teamId") `)
    await queryRunner.query(`DROP INDEX "IDX_5ea93ea22714ae555356636d3d"`)
    await queryRunner.query(`DROP INDEX "IDX_1e80dce6b01b621d30078b1579"`)
    await queryRunner.query(
      `CREATE TABLE "temporary_games" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "opponentId" varchar(36) NOT NULL, "tipOff" text NOT NULL, "place" text NOT NULL, "rulePack" text NOT NULL, "chooseBy" text, "deletedAt" text, "due" text, "holderId" varchar(36), "readAt" text, "readById" varchar(36), "notes" text NOT NULL DEFAULT (''), CONSTRAINT "FK_5ea93ea22714ae555356636d3dc" FOREIGN KEY ("opponentId") REFERENCES "opponents" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "temporary_games"("id", "teamId", "version", "createdAt", "updatedAt", "opponentId", "tipOff", "place", "rulePack", "chooseBy") SELECT "id", "teamId", "version", "createdAt", "updatedAt", "opponentId", "tipOff", "place", "rulePack", "chooseBy" FROM "games"`,
    )
    await queryRunner.query(`DROP TABLE "games"`)
    await queryRunner.query(`ALTER TABLE "temporary_games" RENAME TO "games"`)
    await queryRunner.query(`CREATE INDEX "IDX_5ea93ea22714ae555356636d3d" ON "games" ("opponentId") `)
    await queryRunner.query(`CREATE INDEX "IDX_1e80dce6b01b621d30078b1579" ON "games" ("teamId", "tipOff") `)
    await queryRunner.query(`DROP INDEX "IDX_c52bfc7c313a925cfd2d8e1c52"`)
    await queryRunner.query(
      `CREATE TABLE "temporary_plans" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "gameId" varchar(36) NOT NULL, "number" integer NOT NULL, "firstCallId" varchar(36), "changeUpId" varchar(36), "notThisGame" text NOT NULL, "roles" text NOT NULL, "keys" text NOT NULL, "reason" text NOT NULL, "frozen" text, "signedAt" text, "signedById" varchar(36), "deletedAt" text, CONSTRAINT "FK_f08d419658041cc143248ede723" FOREIGN KEY ("signedById") REFERENCES "people" ("id") ON DELETE SET NULL ON UPDATE NO ACTION, CONSTRAINT "FK_e3369236b661831e6092cc6ea50" FOREIGN KEY ("gameId") REFERENCES "games" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "temporary_plans"("id", "teamId", "version", "createdAt", "updatedAt", "gameId", "number", "firstCallId", "changeUpId", "notThisGame", "roles", "keys", "reason", "frozen", "signedAt", "signedById") SELECT "id", "teamId", "version", "createdAt", "updatedAt", "gameId", "number", "firstCallId", "changeUpId", "notThisGame", "roles", "keys", "reason", "frozen", "signedAt", "signedById" FROM "plans"`,
    )
    await queryRunner.query(`DROP TABLE "plans"`)
    await queryRunner.query(`ALTER TABLE "temporary_plans" RENAME TO "plans"`)
    await queryRunner.query(
      `CREATE UNIQUE INDEX "IDX_c52bfc7c313a925cfd2d8e1c52" ON "plans" ("gameId", "number") `,
    )
    await queryRunner.query(`DROP INDEX "IDX_d0dc9db458efb540c5ecda386c"`)
    await queryRunner.query(`DROP INDEX "IDX_ad690ddf7a966e930acfa2f94d"`)
    await queryRunner.query(
      `CREATE TABLE "temporary_sheets" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "planId" varchar(36) NOT NULL, "createdAt" text NOT NULL, "fuller" boolean NOT NULL DEFAULT (0), "recalledAt" text, CONSTRAINT "FK_d0dc9db458efb540c5ecda386c5" FOREIGN KEY ("planId") REFERENCES "plans" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "temporary_sheets"("id", "teamId", "planId", "createdAt") SELECT "id", "teamId", "planId", "createdAt" FROM "sheets"`,
    )
    await queryRunner.query(`DROP TABLE "sheets"`)
    await queryRunner.query(`ALTER TABLE "temporary_sheets" RENAME TO "sheets"`)
    await queryRunner.query(`CREATE UNIQUE INDEX "IDX_d0dc9db458efb540c5ecda386c" ON "sheets" ("planId") `)
    await queryRunner.query(`CREATE INDEX "IDX_ad690ddf7a966e930acfa2f94d" ON "sheets" ("teamId") `)
    await queryRunner.query(
      `CREATE TABLE "temporary_squad_players" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "jersey" integer NOT NULL, "firstName" text NOT NULL, "lastName" text NOT NULL, "skills" text NOT NULL, "outUntil" text, "deletedAt" text, "guardianEmail" text, "pictureConsent" text NOT NULL DEFAULT ('not-asked'), "sprint20" real, CONSTRAINT "FK_7a46107eadbb77193e9e0427901" FOREIGN KEY ("teamId") REFERENCES "teams" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "temporary_squad_players"("id", "teamId", "version", "createdAt", "updatedAt", "jersey", "firstName", "lastName", "skills", "outUntil") SELECT "id", "teamId", "version", "createdAt", "updatedAt", "jersey", "firstName", "lastName", "skills", "outUntil" FROM "squad_players"`,
    )
    await queryRunner.query(`DROP TABLE "squad_players"`)
    await queryRunner.query(`ALTER TABLE "temporary_squad_players" RENAME TO "squad_players"`)
    await queryRunner.query(`DROP INDEX "IDX_c300d579f1693ceb052085de28"`)
    await queryRunner.query(
      `CREATE TABLE "temporary_counters" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "name" text NOT NULL, "family" text NOT NULL, "body" text NOT NULL, "deletedAt" text, "draft" boolean NOT NULL DEFAULT (0), "archivedAt" text, "walkedAt" text, CONSTRAINT "FK_c300d579f1693ceb052085de28c" FOREIGN KEY ("teamId") REFERENCES "teams" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "temporary_counters"("id", "teamId", "version", "createdAt", "updatedAt", "name", "family", "body") SELECT "id", "teamId", "version", "createdAt", "updatedAt", "name", "family", "body" FROM "counters"`,
    )
    await queryRunner.query(`DROP TABLE "counters"`)
    await queryRunner.query(`ALTER TABLE "temporary_counters" RENAME TO "counters"`)
    await queryRunner.query(`CREATE INDEX "IDX_c300d579f1693ceb052085de28" ON "counters" ("teamId") `)
    await queryRunner.query(`DROP INDEX "IDX_a8f2967ffb040b892f27a7af4b"`)
    await queryRunner.query(
      `CREATE TABLE "temporary_memberships" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "personId" varchar(36) NOT NULL, "role" text NOT NULL, "squadPlayerId" varchar(36), "mail" boolean NOT NULL DEFAULT (1), "version" integer NOT NULL DEFAULT (1), "createdAt" text, CONSTRAINT "FK_1a304d463683ba65a3cc9e7907b" FOREIGN KEY ("squadPlayerId") REFERENCES "squad_players" ("id") ON DELETE SET NULL ON UPDATE NO ACTION, CONSTRAINT "FK_9b5139de55b7990de8ee069b8fc" FOREIGN KEY ("personId") REFERENCES "people" ("id") ON DELETE CASCADE ON UPDATE NO ACTION, CONSTRAINT "FK_f348d359485ec8cf7737253f3d5" FOREIGN KEY ("teamId") REFERENCES "teams" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "temporary_memberships"("id", "teamId", "personId", "role", "squadPlayerId") SELECT "id", "teamId", "personId", "role", "squadPlayerId" FROM "memberships"`,
    )
    await queryRunner.query(`DROP TABLE "memberships"`)
    await queryRunner.query(`ALTER TABLE "temporary_memberships" RENAME TO "memberships"`)
    await queryRunner.query(
      `CREATE UNIQUE INDEX "IDX_a8f2967ffb040b892f27a7af4b" ON "memberships" ("personId", "teamId") `,
    )
    await queryRunner.query(`DROP INDEX "IDX_df2aa3f613e0d7e7cc3ff8b9f7"`)
    await queryRunner.query(`DROP INDEX "IDX_a05e68490af0d62392e4f56a1f"`)
    await queryRunner.query(
      `CREATE TABLE "temporary_scouted_games" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "opponentId" varchar(36) NOT NULL, "foe" text NOT NULL, "playedOn" text NOT NULL, "seen" text NOT NULL, "rulePack" text NOT NULL, "coverageKind" text NOT NULL, "coverageFrom" real, "coverageTo" real, "blowout" boolean NOT NULL, "finalScore" text, "scoutId" varchar(36), "deletedAt" text, "notes" text NOT NULL DEFAULT (''), CONSTRAINT "FK_16bfc54a1a85e5fb45d92d66480" FOREIGN KEY ("scoutId") REFERENCES "people" ("id") ON DELETE SET NULL ON UPDATE NO ACTION, CONSTRAINT "FK_a05e68490af0d62392e4f56a1f5" FOREIGN KEY ("opponentId") REFERENCES "opponents" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "temporary_scouted_games"("id", "teamId", "version", "createdAt", "updatedAt", "opponentId", "foe", "playedOn", "seen", "rulePack", "coverageKind", "coverageFrom", "coverageTo", "blowout", "finalScore", "scoutId") SELECT "id", "teamId", "version", "createdAt", "updatedAt", "opponentId", "foe", "playedOn", "seen", "rulePack", "coverageKind", "coverageFrom", "coverageTo", "blowout", "finalScore", "scoutId" FROM "scouted_games"`,
    )
    await queryRunner.query(`DROP TABLE "scouted_games"`)
    await queryRunner.query(`ALTER TABLE "temporary_scouted_games" RENAME TO "scouted_games"`)
    await queryRunner.query(`CREATE INDEX "IDX_df2aa3f613e0d7e7cc3ff8b9f7" ON "scouted_games" ("teamId") `)
    await queryRunner.query(
      `CREATE INDEX "IDX_a05e68490af0d62392e4f56a1f" ON "scouted_games" ("opponentId") `,
    )
    await queryRunner.query(`DROP INDEX "IDX_790d7dde3088987d33f82aaf5e"`)
    await queryRunner.query(
      `CREATE TABLE "temporary_stills" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "possessionId" varchar(36) NOT NULL, "position" integer NOT NULL, "t" real, "caption" text NOT NULL, "width" integer NOT NULL, "height" integer NOT NULL, "digest" text NOT NULL, "createdAt" text NOT NULL, "marks" text, "blurred" integer NOT NULL DEFAULT (0), "facesLeft" integer, "inReport" boolean NOT NULL DEFAULT (0), "expiresOn" text, "version" integer NOT NULL DEFAULT (1), CONSTRAINT "FK_50ce0b14226fd3201bd98f14c68" FOREIGN KEY ("possessionId") REFERENCES "possessions" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "temporary_stills"("id", "teamId", "possessionId", "position", "t", "caption", "width", "height", "digest", "createdAt") SELECT "id", "teamId", "possessionId", "position", "t", "caption", "width", "height", "digest", "createdAt" FROM "stills"`,
    )
    await queryRunner.query(`DROP TABLE "stills"`)
    await queryRunner.query(`ALTER TABLE "temporary_stills" RENAME TO "stills"`)
    await queryRunner.query(
      `CREATE INDEX "IDX_790d7dde3088987d33f82aaf5e" ON "stills" ("possessionId", "position") `,
    )
    await queryRunner.query(`DROP INDEX "IDX_42bedd379e5e9945d65aba510d"`)
    await queryRunner.query(
      `CREATE TABLE "temporary_traps" ("id" varchar(36) PRIMARY KEY NOT NULL, "possessionId" varchar(36) NOT NULL, "position" integer NOT NULL, "x" real NOT NULL, "y" real NOT NULL, "t" real, "cue" text, "result" text, "trappers" text, CONSTRAINT "FK_47746c8177370b5a8ca3eee8e17" FOREIGN KEY ("possessionId") REFERENCES "possessions" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "temporary_traps"("id", "possessionId", "position", "x", "y", "t", "cue", "result") SELECT "id", "possessionId", "position", "x", "y", "t", "cue", "result" FROM "traps"`,
    )
    await queryRunner.query(`DROP TABLE "traps"`)
    await queryRunner.query(`ALTER TABLE "temporary_traps" RENAME TO "traps"`)
    await queryRunner.query(
      `CREATE UNIQUE INDEX "IDX_42bedd379e5e9945d65aba510d" ON "traps" ("possessionId", "position") `,
    )
    await queryRunner.query(`DROP INDEX "IDX_e26d9a35b166697be899b1ed3e"`)
    await queryRunner.query(`DROP INDEX "IDX_d75981f4e452fbe445bd69f5ab"`)
    await queryRunner.query(`DROP INDEX "IDX_a2a0a26e0ae3d3101c1796d57d"`)
    await queryRunner.query(`DROP INDEX "IDX_0497efad4a7a0e916576ff3dde"`)
    await queryRunner.query(
      `CREATE TABLE "temporary_possessions" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "scoutedGameId" varchar(36), "gameId" varchar(36), "frame" integer NOT NULL, "tripId" varchar(36), "number" integer NOT NULL, "period" integer, "clock" integer, "margin" integer, "trigger" text NOT NULL, "shape" text, "shapeVariant" text, "pickup" text, "trapsLogged" text, "outcome" text, "outcomePlace" text, "throwerGuard" text, "denied" text, "tookAway" text, "leftOpen" text, "onBall" text, "handler" text, "goalie" text, "shownShape" text, "crossedAt" real, "track" text, "note" text NOT NULL, "counterId" varchar(36), "rightCall" boolean, "runWell" boolean, "deletedAt" text, "forcedSide" text, "entrySpot" text, "receiver" text, "onFloor" text, "thief" text, "passes" integer, "reversals" integer, "fallback" text, "finish" text, "points" integer, "pointsAgainst" integer, "timeOutBurned" boolean, "filmTime" real, CONSTRAINT "CHK_84010d199d2cfb50c2289df971" CHECK ((("scoutedGameId" IS NULL) <> ("gameId" IS NULL))), CONSTRAINT "FK_1b69da19527bf8a038edfdf0d03" FOREIGN KEY ("counterId") REFERENCES "counters" ("id") ON DELETE SET NULL ON UPDATE NO ACTION, CONSTRAINT "FK_5fe5d0d98b44128946beea21d17" FOREIGN KEY ("gameId") REFERENCES "games" ("id") ON DELETE CASCADE ON UPDATE NO ACTION, CONSTRAINT "FK_2ca30a176df473847c4362d4bd9" FOREIGN KEY ("scoutedGameId") REFERENCES "scouted_games" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "temporary_possessions"("id", "teamId", "version", "createdAt", "updatedAt", "scoutedGameId", "gameId", "frame", "tripId", "number", "period", "clock", "margin", "trigger", "shape", "shapeVariant", "pickup", "trapsLogged", "outcome", "outcomePlace", "throwerGuard", "denied", "tookAway", "leftOpen", "onBall", "handler", "goalie", "shownShape", "crossedAt", "track", "note", "counterId", "rightCall", "runWell", "deletedAt") SELECT "id", "teamId", "version", "createdAt", "updatedAt", "scoutedGameId", "gameId", "frame", "tripId", "number", "period", "clock", "margin", "trigger", "shape", "shapeVariant", "pickup", "trapsLogged", "outcome", "outcomePlace", "throwerGuard", "denied", "tookAway", "leftOpen", "onBall", "handler", "goalie", "shownShape", "crossedAt", "track", "note", "counterId", "rightCall", "runWell", "deletedAt" FROM "possessions"`,
    )
    await queryRunner.query(`DROP TABLE "possessions"`)
    await queryRunner.query(`ALTER TABLE "temporary_possessions" RENAME TO "possessions"`)
    await queryRunner.query(
      `CREATE INDEX "IDX_e26d9a35b166697be899b1ed3e" ON "possessions" ("scoutedGameId", "number") `,
    )
    await queryRunner.query(
      `CREATE INDEX "IDX_d75981f4e452fbe445bd69f5ab" ON "possessions" ("gameId", "number") `,
    )
    await queryRunner.query(
      `CREATE INDEX "IDX_a2a0a26e0ae3d3101c1796d57d" ON "possessions" ("teamId", "counterId") `,
    )
    await queryRunner.query(`CREATE INDEX "IDX_0497efad4a7a0e916576ff3dde" ON "possessions" ("deletedAt") `)
    await queryRunner.query(`DROP INDEX "IDX_56f33bdd3871ff2bf7d1f2fc33"`)
    await queryRunner.query(
      `CREATE TABLE "temporary_rules" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "number" integer, "on" boolean NOT NULL, "body" text NOT NULL, "deletedAt" text, CONSTRAINT "FK_56f33bdd3871ff2bf7d1f2fc33a" FOREIGN KEY ("teamId") REFERENCES "teams" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "temporary_rules"("id", "teamId", "version", "createdAt", "updatedAt", "number", "on", "body") SELECT "id", "teamId", "version", "createdAt", "updatedAt", "number", "on", "body" FROM "rules"`,
    )
    await queryRunner.query(`DROP TABLE "rules"`)
    await queryRunner.query(`ALTER TABLE "temporary_rules" RENAME TO "rules"`)
    await queryRunner.query(`CREATE INDEX "IDX_56f33bdd3871ff2bf7d1f2fc33" ON "rules" ("teamId") `)
    await queryRunner.query(
      `CREATE UNIQUE INDEX "IDX_f9dd154c90609a6263a2e65fe9" ON "squad_players" ("teamId", "jersey") WHERE "deletedAt" IS NULL`,
    )
    await queryRunner.query(`DROP INDEX "IDX_d1846ad223eba024f4d843d55b"`)
    await queryRunner.query(`DROP INDEX "IDX_6860b148cb8124b004d3052ea3"`)
    await queryRunner.query(`DROP INDEX "IDX_7a5db8fd1061dec279d359176b"`)
    await queryRunner.query(
      `CREATE TABLE "temporary_changes" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "kind" text NOT NULL, "rowId" varchar(36) NOT NULL, "action" text NOT NULL, "personId" varchar(36), "at" text NOT NULL, "batchId" varchar(36), "fields" text NOT NULL, CONSTRAINT "FK_3e790112202df70b8aaf3972973" FOREIGN KEY ("teamId") REFERENCES "teams" ("id") ON DELETE CASCADE ON UPDATE NO ACTION, CONSTRAINT "FK_a57451aacdd99747c4b00a63e83" FOREIGN KEY ("personId") REFERENCES "people" ("id") ON DELETE SET NULL ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "temporary_changes"("id", "teamId", "kind", "rowId", "action", "personId", "at", "batchId", "fields") SELECT "id", "teamId", "kind", "rowId", "action", "personId", "at", "batchId", "fields" FROM "changes"`,
    )
    await queryRunner.query(`DROP TABLE "changes"`)
    await queryRunner.query(`ALTER TABLE "temporary_changes" RENAME TO "changes"`)
    await queryRunner.query(`CREATE INDEX "IDX_d1846ad223eba024f4d843d55b" ON "changes" ("batchId") `)
    await queryRunner.query(`CREATE INDEX "IDX_6860b148cb8124b004d3052ea3" ON "changes" ("teamId", "at") `)
    await queryRunner.query(`CREATE INDEX "IDX_7a5db8fd1061dec279d359176b" ON "changes" ("rowId", "at") `)
    await queryRunner.query(`DROP INDEX "IDX_5ea93ea22714ae555356636d3d"`)
    await queryRunner.query(`DROP INDEX "IDX_1e80dce6b01b621d30078b1579"`)
    await queryRunner.query(
      `CREATE TABLE "temporary_games" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "opponentId" varchar(36) NOT NULL, "tipOff" text NOT NULL, "place" text NOT NULL, "rulePack" text NOT NULL, "chooseBy" text, "deletedAt" text, "due" text, "holderId" varchar(36), "readAt" text, "readById" varchar(36), "notes" text NOT NULL DEFAULT (''), CONSTRAINT "FK_5ea93ea22714ae555356636d3dc" FOREIGN KEY ("opponentId") REFERENCES "opponents" ("id") ON DELETE CASCADE ON UPDATE NO ACTION, CONSTRAINT "FK_dba9f9fd1c04c156ba6a17ece51" FOREIGN KEY ("holderId") REFERENCES "people" ("id") ON DELETE SET NULL ON UPDATE NO ACTION, CONSTRAINT "FK_756923eac437c129eb621f8afde" FOREIGN KEY ("readById") REFERENCES "people" ("id") ON DELETE SET NULL ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "temporary_games"("id", "teamId", "version", "createdAt", "updatedAt", "opponentId", "tipOff", "place", "rulePack", "chooseBy", "deletedAt", "due", "holderId", "readAt", "readById", "notes") SELECT "id", "teamId", "version", "createdAt", "updatedAt", "opponentId", "tipOff", "place", "rulePack", "chooseBy", "deletedAt", "due", "holderId", "readAt", "readById", "notes" FROM "games"`,
    )
    await queryRunner.query(`DROP TABLE "games"`)
    await queryRunner.query(`ALTER TABLE "temporary_games" RENAME TO "games"`)
    await queryRunner.query(`CREATE INDEX "IDX_5ea93ea22714ae555356636d3d" ON "games" ("opponentId") `)
    await queryRunner.query(`CREATE INDEX "IDX_1e80dce6b01b621d30078b1579" ON "games" ("teamId", "tipOff") `)
    await queryRunner.query(`DROP INDEX "IDX_37e1cc613862a767f601c08eff"`)
    await queryRunner.query(
      `CREATE TABLE "temporary_copies" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "deletedAt" text, "sheetId" varchar(36) NOT NULL, "number" integer, "squadPlayerId" varchar(36), "way" text NOT NULL, "outAt" text, "backAt" text, "mailId" varchar(36), CONSTRAINT "FK_3cdaac71173c57db49016c3ba83" FOREIGN KEY ("sheetId") REFERENCES "sheets" ("id") ON DELETE CASCADE ON UPDATE NO ACTION, CONSTRAINT "FK_50ab9a3a38e19194a5fdc9fe9c9" FOREIGN KEY ("squadPlayerId") REFERENCES "squad_players" ("id") ON DELETE SET NULL ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "temporary_copies"("id", "teamId", "version", "createdAt", "updatedAt", "deletedAt", "sheetId", "number", "squadPlayerId", "way", "outAt", "backAt", "mailId") SELECT "id", "teamId", "version", "createdAt", "updatedAt", "deletedAt", "sheetId", "number", "squadPlayerId", "way", "outAt", "backAt", "mailId" FROM "copies"`,
    )
    await queryRunner.query(`DROP TABLE "copies"`)
    await queryRunner.query(`ALTER TABLE "temporary_copies" RENAME TO "copies"`)
    await queryRunner.query(
      `CREATE UNIQUE INDEX "IDX_37e1cc613862a767f601c08eff" ON "copies" ("sheetId", "number") `,
    )
    await queryRunner.query(`DROP INDEX "IDX_6fb8e81d69311e7c5e57ed59c3"`)
    await queryRunner.query(`DROP INDEX "IDX_e7dbe3dccca08919606f981b29"`)
    await queryRunner.query(
      `CREATE TABLE "temporary_erasures" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "deletedAt" text, "kind" text NOT NULL, "subjectId" varchar(36) NOT NULL, "askedById" varchar(36), "dueAt" text NOT NULL, "stoppedAt" text, "stoppedById" varchar(36), "doneAt" text, CONSTRAINT "FK_e7dbe3dccca08919606f981b299" FOREIGN KEY ("teamId") REFERENCES "teams" ("id") ON DELETE CASCADE ON UPDATE NO ACTION, CONSTRAINT "FK_43e7140b87254f5270aee52d519" FOREIGN KEY ("askedById") REFERENCES "people" ("id") ON DELETE SET NULL ON UPDATE NO ACTION, CONSTRAINT "FK_4800c8eab9d2e9f18a1dd267314" FOREIGN KEY ("stoppedById") REFERENCES "people" ("id") ON DELETE SET NULL ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "temporary_erasures"("id", "teamId", "version", "createdAt", "updatedAt", "deletedAt", "kind", "subjectId", "askedById", "dueAt", "stoppedAt", "stoppedById", "doneAt") SELECT "id", "teamId", "version", "createdAt", "updatedAt", "deletedAt", "kind", "subjectId", "askedById", "dueAt", "stoppedAt", "stoppedById", "doneAt" FROM "erasures"`,
    )
    await queryRunner.query(`DROP TABLE "erasures"`)
    await queryRunner.query(`ALTER TABLE "temporary_erasures" RENAME TO "erasures"`)
    await queryRunner.query(`CREATE INDEX "IDX_6fb8e81d69311e7c5e57ed59c3" ON "erasures" ("dueAt") `)
    await queryRunner.query(`CREATE INDEX "IDX_e7dbe3dccca08919606f981b29" ON "erasures" ("teamId") `)
    await queryRunner.query(`DROP INDEX "IDX_d4f92c09c980f549db94241b6c"`)
    await queryRunner.query(`DROP INDEX "IDX_8c99ea56cc137affd9526770cb"`)
    await queryRunner.query(
      `CREATE TABLE "temporary_hand_ons" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "gameId" varchar(36) NOT NULL, "station" text NOT NULL, "fromId" varchar(36), "toId" varchar(36), "note" text NOT NULL DEFAULT (''), "at" text NOT NULL, CONSTRAINT "FK_05fc70c222805427cf5804f0f45" FOREIGN KEY ("gameId") REFERENCES "games" ("id") ON DELETE CASCADE ON UPDATE NO ACTION, CONSTRAINT "FK_dd015fb817380d228bfaed8a518" FOREIGN KEY ("fromId") REFERENCES "people" ("id") ON DELETE SET NULL ON UPDATE NO ACTION, CONSTRAINT "FK_c304496faeaaf9aefa2cafa64eb" FOREIGN KEY ("toId") REFERENCES "people" ("id") ON DELETE SET NULL ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "temporary_hand_ons"("id", "teamId", "gameId", "station", "fromId", "toId", "note", "at") SELECT "id", "teamId", "gameId", "station", "fromId", "toId", "note", "at" FROM "hand_ons"`,
    )
    await queryRunner.query(`DROP TABLE "hand_ons"`)
    await queryRunner.query(`ALTER TABLE "temporary_hand_ons" RENAME TO "hand_ons"`)
    await queryRunner.query(`CREATE INDEX "IDX_d4f92c09c980f549db94241b6c" ON "hand_ons" ("teamId", "at") `)
    await queryRunner.query(`CREATE INDEX "IDX_8c99ea56cc137affd9526770cb" ON "hand_ons" ("gameId", "at") `)
    await queryRunner.query(`DROP INDEX "IDX_a6eb6f2543de8a5a4c148b32a1"`)
    await queryRunner.query(`DROP INDEX "IDX_113cb1411bac0e764b922699d4"`)
    await queryRunner.query(
      `CREATE TABLE "temporary_invitations" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "deletedAt" text, "role" text NOT NULL, "squadPlayerId" varchar(36), "email" text, "tokenHash" text NOT NULL, "expiresAt" text NOT NULL, "invitedById" varchar(36), "usedAt" text, "usedById" varchar(36), "revokedAt" text, CONSTRAINT "FK_113cb1411bac0e764b922699d4b" FOREIGN KEY ("teamId") REFERENCES "teams" ("id") ON DELETE CASCADE ON UPDATE NO ACTION, CONSTRAINT "FK_a1e998d72ec79cb9f9ab2879db9" FOREIGN KEY ("squadPlayerId") REFERENCES "squad_players" ("id") ON DELETE CASCADE ON UPDATE NO ACTION, CONSTRAINT "FK_b60325e5302be0dad38b423314c" FOREIGN KEY ("invitedById") REFERENCES "people" ("id") ON DELETE SET NULL ON UPDATE NO ACTION, CONSTRAINT "FK_69046f62e967ebdd08cdd6fb711" FOREIGN KEY ("usedById") REFERENCES "people" ("id") ON DELETE SET NULL ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "temporary_invitations"("id", "teamId", "version", "createdAt", "updatedAt", "deletedAt", "role", "squadPlayerId", "email", "tokenHash", "expiresAt", "invitedById", "usedAt", "usedById", "revokedAt") SELECT "id", "teamId", "version", "createdAt", "updatedAt", "deletedAt", "role", "squadPlayerId", "email", "tokenHash", "expiresAt", "invitedById", "usedAt", "usedById", "revokedAt" FROM "invitations"`,
    )
    await queryRunner.query(`DROP TABLE "invitations"`)
    await queryRunner.query(`ALTER TABLE "temporary_invitations" RENAME TO "invitations"`)
    await queryRunner.query(
      `CREATE UNIQUE INDEX "IDX_a6eb6f2543de8a5a4c148b32a1" ON "invitations" ("tokenHash") `,
    )
    await queryRunner.query(`CREATE INDEX "IDX_113cb1411bac0e764b922699d4" ON "invitations" ("teamId") `)
    await queryRunner.query(`DROP INDEX "IDX_bbdc05b09d5283dc0ddc2fc8eb"`)
    await queryRunner.query(`DROP INDEX "IDX_182b2632a42ce2d18955036a3f"`)
    await queryRunner.query(`DROP INDEX "IDX_35cb78fb93442d2da1e94d483e"`)
    await queryRunner.query(
      `CREATE TABLE "temporary_mails" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36), "kind" text NOT NULL, "onceKey" text NOT NULL, "aboutId" varchar(36), "recipient" text NOT NULL, "subject" text NOT NULL, "text" text NOT NULL, "html" text NOT NULL, "attachment" text, "state" text NOT NULL, "tries" integer NOT NULL DEFAULT (0), "nextTryAt" text, "trouble" text, "sentAt" text, "createdAt" text NOT NULL, CONSTRAINT "FK_3537fc5908b940800895bf77760" FOREIGN KEY ("teamId") REFERENCES "teams" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "temporary_mails"("id", "teamId", "kind", "onceKey", "aboutId", "recipient", "subject", "text", "html", "attachment", "state", "tries", "nextTryAt", "trouble", "sentAt", "createdAt") SELECT "id", "teamId", "kind", "onceKey", "aboutId", "recipient", "subject", "text", "html", "attachment", "state", "tries", "nextTryAt", "trouble", "sentAt", "createdAt" FROM "mails"`,
    )
    await queryRunner.query(`DROP TABLE "mails"`)
    await queryRunner.query(`ALTER TABLE "temporary_mails" RENAME TO "mails"`)
    await queryRunner.query(`CREATE UNIQUE INDEX "IDX_bbdc05b09d5283dc0ddc2fc8eb" ON "mails" ("onceKey") `)
    await queryRunner.query(
      `CREATE INDEX "IDX_182b2632a42ce2d18955036a3f" ON "mails" ("state", "nextTryAt") `,
    )
    await queryRunner.query(
      `CREATE INDEX "IDX_35cb78fb93442d2da1e94d483e" ON "mails" ("teamId", "createdAt") `,
    )
    await queryRunner.query(`DROP INDEX "IDX_75e0b6d0a4d5a2cdaf59edb20a"`)
    await queryRunner.query(
      `CREATE TABLE "temporary_openings" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "sheetId" varchar(36) NOT NULL, "personId" varchar(36) NOT NULL, "firstAt" text NOT NULL, "lastAt" text NOT NULL, CONSTRAINT "FK_b02811a717322203e728b8962a0" FOREIGN KEY ("sheetId") REFERENCES "sheets" ("id") ON DELETE CASCADE ON UPDATE NO ACTION, CONSTRAINT "FK_e8ec74477ea13010dc3359df3c0" FOREIGN KEY ("personId") REFERENCES "people" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "temporary_openings"("id", "teamId", "sheetId", "personId", "firstAt", "lastAt") SELECT "id", "teamId", "sheetId", "personId", "firstAt", "lastAt" FROM "openings"`,
    )
    await queryRunner.query(`DROP TABLE "openings"`)
    await queryRunner.query(`ALTER TABLE "temporary_openings" RENAME TO "openings"`)
    await queryRunner.query(
      `CREATE UNIQUE INDEX "IDX_75e0b6d0a4d5a2cdaf59edb20a" ON "openings" ("sheetId", "personId") `,
    )
    await queryRunner.query(`DROP INDEX "IDX_60cadb07d3b5225ef1ace353d6"`)
    await queryRunner.query(
      `CREATE TABLE "temporary_opponent_players" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "deletedAt" text, "opponentId" varchar(36) NOT NULL, "jersey" integer NOT NULL, "does" text NOT NULL, "note" text NOT NULL DEFAULT (''), CONSTRAINT "FK_760507cd9f9e0de667abb4eec17" FOREIGN KEY ("opponentId") REFERENCES "opponents" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "temporary_opponent_players"("id", "teamId", "version", "createdAt", "updatedAt", "deletedAt", "opponentId", "jersey", "does", "note") SELECT "id", "teamId", "version", "createdAt", "updatedAt", "deletedAt", "opponentId", "jersey", "does", "note" FROM "opponent_players"`,
    )
    await queryRunner.query(`DROP TABLE "opponent_players"`)
    await queryRunner.query(`ALTER TABLE "temporary_opponent_players" RENAME TO "opponent_players"`)
    await queryRunner.query(
      `CREATE UNIQUE INDEX "IDX_60cadb07d3b5225ef1ace353d6" ON "opponent_players" ("opponentId", "jersey") WHERE "deletedAt" IS NULL`,
    )
    await queryRunner.query(`DROP INDEX "IDX_d7b6b606688f35879dc07d4278"`)
    await queryRunner.query(`DROP INDEX "IDX_7f6aae0fcc807c9e7194ca5cc4"`)
    await queryRunner.query(
      `CREATE TABLE "temporary_password_resets" ("id" varchar(36) PRIMARY KEY NOT NULL, "personId" varchar(36) NOT NULL, "tokenHash" text NOT NULL, "createdAt" text NOT NULL, "expiresAt" text NOT NULL, "usedAt" text, CONSTRAINT "FK_d7b6b606688f35879dc07d42781" FOREIGN KEY ("personId") REFERENCES "people" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "temporary_password_resets"("id", "personId", "tokenHash", "createdAt", "expiresAt", "usedAt") SELECT "id", "personId", "tokenHash", "createdAt", "expiresAt", "usedAt" FROM "password_resets"`,
    )
    await queryRunner.query(`DROP TABLE "password_resets"`)
    await queryRunner.query(`ALTER TABLE "temporary_password_resets" RENAME TO "password_resets"`)
    await queryRunner.query(
      `CREATE INDEX "IDX_d7b6b606688f35879dc07d4278" ON "password_resets" ("personId") `,
    )
    await queryRunner.query(
      `CREATE UNIQUE INDEX "IDX_7f6aae0fcc807c9e7194ca5cc4" ON "password_resets" ("tokenHash") `,
    )
    await queryRunner.query(`DROP INDEX "IDX_c467e402063162bfcfede4c7d6"`)
    await queryRunner.query(`DROP INDEX "IDX_954b4a3770543d4daedbb693e3"`)
    await queryRunner.query(
      `CREATE TABLE "temporary_practices" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "deletedAt" text, "gameId" varchar(36) NOT NULL, "startsAt" text NOT NULL, "body" text NOT NULL, CONSTRAINT "FK_c467e402063162bfcfede4c7d62" FOREIGN KEY ("gameId") REFERENCES "games" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "temporary_practices"("id", "teamId", "version", "createdAt", "updatedAt", "deletedAt", "gameId", "startsAt", "body") SELECT "id", "teamId", "version", "createdAt", "updatedAt", "deletedAt", "gameId", "startsAt", "body" FROM "practices"`,
    )
    await queryRunner.query(`DROP TABLE "practices"`)
    await queryRunner.query(`ALTER TABLE "temporary_practices" RENAME TO "practices"`)
    await queryRunner.query(`CREATE INDEX "IDX_c467e402063162bfcfede4c7d6" ON "practices" ("gameId") `)
    await queryRunner.query(
      `CREATE INDEX "IDX_954b4a3770543d4daedbb693e3" ON "practices" ("teamId", "startsAt") `,
    )
    await queryRunner.query(`DROP INDEX "IDX_3de04e9d6024588834a0179896"`)
    await queryRunner.query(`DROP INDEX "IDX_0b5136d56d15f10fe676f6d7c8"`)
    await queryRunner.query(
      `CREATE TABLE "temporary_practice_reps" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "practiceId" varchar(36) NOT NULL, "counterId" varchar(36) NOT NULL, "shape" text, "kind" text NOT NULL, "n" integer NOT NULL, "k" integer, CONSTRAINT "FK_0b5136d56d15f10fe676f6d7c81" FOREIGN KEY ("practiceId") REFERENCES "practices" ("id") ON DELETE CASCADE ON UPDATE NO ACTION, CONSTRAINT "FK_dbb65e2c4eabc254a24ee6ea580" FOREIGN KEY ("counterId") REFERENCES "counters" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "temporary_practice_reps"("id", "teamId", "practiceId", "counterId", "shape", "kind", "n", "k") SELECT "id", "teamId", "practiceId", "counterId", "shape", "kind", "n", "k" FROM "practice_reps"`,
    )
    await queryRunner.query(`DROP TABLE "practice_reps"`)
    await queryRunner.query(`ALTER TABLE "temporary_practice_reps" RENAME TO "practice_reps"`)
    await queryRunner.query(
      `CREATE INDEX "IDX_3de04e9d6024588834a0179896" ON "practice_reps" ("teamId", "counterId") `,
    )
    await queryRunner.query(
      `CREATE INDEX "IDX_0b5136d56d15f10fe676f6d7c8" ON "practice_reps" ("practiceId") `,
    )
    await queryRunner.query('PRAGMA legacy_alter_table = OFF')
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    // A rebuilt table takes its old name again; what refers to it must not be rewritten meanwhile.
    await queryRunner.query('PRAGMA legacy_alter_table = ON')
    await queryRunner.query(`DROP INDEX "IDX_0b5136d56d15f10fe676f6d7c8"`)
    await queryRunner.query(`DROP INDEX "IDX_3de04e9d6024588834a0179896"`)
    await queryRunner.query(`ALTER TABLE "practice_reps" RENAME TO "temporary_practice_reps"`)
    await queryRunner.query(
      `CREATE TABLE "practice_reps" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "practiceId" varchar(36) NOT NULL, "counterId" varchar(36) NOT NULL, "shape" text, "kind" text NOT NULL, "n" integer NOT NULL, "k" integer)`,
    )
    await queryRunner.query(
      `INSERT INTO "practice_reps"("id", "teamId", "practiceId", "counterId", "shape", "kind", "n", "k") SELECT "id", "teamId", "practiceId", "counterId", "shape", "kind", "n", "k" FROM "temporary_practice_reps"`,
    )
    await queryRunner.query(`DROP TABLE "temporary_practice_reps"`)
    await queryRunner.query(
      `CREATE INDEX "IDX_0b5136d56d15f10fe676f6d7c8" ON "practice_reps" ("practiceId") `,
    )
    await queryRunner.query(
      `CREATE INDEX "IDX_3de04e9d6024588834a0179896" ON "practice_reps" ("teamId", "counterId") `,
    )
    await queryRunner.query(`DROP INDEX "IDX_954b4a3770543d4daedbb693e3"`)
    await queryRunner.query(`DROP INDEX "IDX_c467e402063162bfcfede4c7d6"`)
    await queryRunner.query(`ALTER TABLE "practices" RENAME TO "temporary_practices"`)
    await queryRunner.query(
      `CREATE TABLE "practices" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "deletedAt" text, "gameId" varchar(36) NOT NULL, "startsAt" text NOT NULL, "body" text NOT NULL)`,
    )
    await queryRunner.query(
      `INSERT INTO "practices"("id", "teamId", "version", "createdAt", "updatedAt", "deletedAt", "gameId", "startsAt", "body") SELECT "id", "teamId", "version", "createdAt", "updatedAt", "deletedAt", "gameId", "startsAt", "body" FROM "temporary_practices"`,
    )
    await queryRunner.query(`DROP TABLE "temporary_practices"`)
    await queryRunner.query(
      `CREATE INDEX "IDX_954b4a3770543d4daedbb693e3" ON "practices" ("teamId", "startsAt") `,
    )
    await queryRunner.query(`CREATE INDEX "IDX_c467e402063162bfcfede4c7d6" ON "practices" ("gameId") `)
    await queryRunner.query(`DROP INDEX "IDX_7f6aae0fcc807c9e7194ca5cc4"`)
    await queryRunner.query(`DROP INDEX "IDX_d7b6b606688f35879dc07d4278"`)
    await queryRunner.query(`ALTER TABLE "password_resets" RENAME TO "temporary_password_resets"`)
    await queryRunner.query(
      `CREATE TABLE "password_resets" ("id" varchar(36) PRIMARY KEY NOT NULL, "personId" varchar(36) NOT NULL, "tokenHash" text NOT NULL, "createdAt" text NOT NULL, "expiresAt" text NOT NULL, "usedAt" text)`,
    )
    await queryRunner.query(
      `INSERT INTO "password_resets"("id", "personId", "tokenHash", "createdAt", "expiresAt", "usedAt") SELECT "id", "personId", "tokenHash", "createdAt", "expiresAt", "usedAt" FROM "temporary_password_resets"`,
    )
    await queryRunner.query(`DROP TABLE "temporary_password_resets"`)
    await queryRunner.query(
      `CREATE UNIQUE INDEX "IDX_7f6aae0fcc807c9e7194ca5cc4" ON "password_resets" ("tokenHash") `,
    )
    await queryRunner.query(
      `CREATE INDEX "IDX_d7b6b606688f35879dc07d4278" ON "password_resets" ("personId") `,
    )
    await queryRunner.query(`DROP INDEX "IDX_60cadb07d3b5225ef1ace353d6"`)
    await queryRunner.query(`ALTER TABLE "opponent_players" RENAME TO "temporary_opponent_players"`)
    await queryRunner.query(
      `CREATE TABLE "opponent_players" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "deletedAt" text, "opponentId" varchar(36) NOT NULL, "jersey" integer NOT NULL, "does" text NOT NULL, "note" text NOT NULL DEFAULT (''))`,
    )
    await queryRunner.query(
      `INSERT INTO "opponent_players"("id", "teamId", "version", "createdAt", "updatedAt", "deletedAt", "opponentId", "jersey", "does", "note") SELECT "id", "teamId", "version", "createdAt", "updatedAt", "deletedAt", "opponentId", "jersey", "does", "note" FROM "temporary_opponent_players"`,
    )
    await queryRunner.query(`DROP TABLE "temporary_opponent_players"`)
    await queryRunner.query(
      `CREATE UNIQUE INDEX "IDX_60cadb07d3b5225ef1ace353d6" ON "opponent_players" ("opponentId", "jersey") WHERE "deletedAt" IS NULL`,
    )
    await queryRunner.query(`DROP INDEX "IDX_75e0b6d0a4d5a2cdaf59edb20a"`)
    await queryRunner.query(`ALTER TABLE "openings" RENAME TO "temporary_openings"`)
    await queryRunner.query(
      `CREATE TABLE "openings" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "sheetId" varchar(36) NOT NULL, "personId" varchar(36) NOT NULL, "firstAt" text NOT NULL, "lastAt" text NOT NULL)`,
    )
    await queryRunner.query(
      `INSERT INTO "openings"("id", "teamId", "sheetId", "personId", "firstAt", "lastAt") SELECT "id", "teamId", "sheetId", "personId", "firstAt", "lastAt" FROM "temporary_openings"`,
    )
    await queryRunner.query(`DROP TABLE "temporary_openings"`)
    await queryRunner.query(
      `CREATE UNIQUE INDEX "IDX_75e0b6d0a4d5a2cdaf59edb20a" ON "openings" ("sheetId", "personId") `,
    )
    await queryRunner.query(`DROP INDEX "IDX_35cb78fb93442d2da1e94d483e"`)
    await queryRunner.query(`DROP INDEX "IDX_182b2632a42ce2d18955036a3f"`)
    await queryRunner.query(`DROP INDEX "IDX_bbdc05b09d5283dc0ddc2fc8eb"`)
    await queryRunner.query(`ALTER TABLE "mails" RENAME TO "temporary_mails"`)
    await queryRunner.query(
      `CREATE TABLE "mails" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36), "kind" text NOT NULL, "onceKey" text NOT NULL, "aboutId" varchar(36), "recipient" text NOT NULL, "subject" text NOT NULL, "text" text NOT NULL, "html" text NOT NULL, "attachment" text, "state" text NOT NULL, "tries" integer NOT NULL DEFAULT (0), "nextTryAt" text, "trouble" text, "sentAt" text, "createdAt" text NOT NULL)`,
    )
    await queryRunner.query(
      `INSERT INTO "mails"("id", "teamId", "kind", "onceKey", "aboutId", "recipient", "subject", "text", "html", "attachment", "state", "tries", "nextTryAt", "trouble", "sentAt", "createdAt") SELECT "id", "teamId", "kind", "onceKey", "aboutId", "recipient", "subject", "text", "html", "attachment", "state", "tries", "nextTryAt", "trouble", "sentAt", "createdAt" FROM "temporary_mails"`,
    )
    await queryRunner.query(`DROP TABLE "temporary_mails"`)
    await queryRunner.query(
      `CREATE INDEX "IDX_35cb78fb93442d2da1e94d483e" ON "mails" ("teamId", "createdAt") `,
    )
    await queryRunner.query(
      `CREATE INDEX "IDX_182b2632a42ce2d18955036a3f" ON "mails" ("state", "nextTryAt") `,
    )
    await queryRunner.query(`CREATE UNIQUE INDEX "IDX_bbdc05b09d5283dc0ddc2fc8eb" ON "mails" ("onceKey") `)
    await queryRunner.query(`DROP INDEX "IDX_113cb1411bac0e764b922699d4"`)
    await queryRunner.query(`DROP INDEX "IDX_a6eb6f2543de8a5a4c148b32a1"`)
    await queryRunner.query(`ALTER TABLE "invitations" RENAME TO "temporary_invitations"`)
    await queryRunner.query(
      `CREATE TABLE "invitations" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "deletedAt" text, "role" text NOT NULL, "squadPlayerId" varchar(36), "email" text, "tokenHash" text NOT NULL, "expiresAt" text NOT NULL, "invitedById" varchar(36), "usedAt" text, "usedById" varchar(36), "revokedAt" text)`,
    )
    await queryRunner.query(
      `INSERT INTO "invitations"("id", "teamId", "version", "createdAt", "updatedAt", "deletedAt", "role", "squadPlayerId", "email", "tokenHash", "expiresAt", "invitedById", "usedAt", "usedById", "revokedAt") SELECT "id", "teamId", "version", "createdAt", "updatedAt", "deletedAt", "role", "squadPlayerId", "email", "tokenHash", "expiresAt", "invitedById", "usedAt", "usedById", "revokedAt" FROM "temporary_invitations"`,
    )
    await queryRunner.query(`DROP TABLE "temporary_invitations"`)
    await queryRunner.query(`CREATE INDEX "IDX_113cb1411bac0e764b922699d4" ON "invitations" ("teamId") `)
    await queryRunner.query(
      `CREATE UNIQUE INDEX "IDX_a6eb6f2543de8a5a4c148b32a1" ON "invitations" ("tokenHash") `,
    )
    await queryRunner.query(`DROP INDEX "IDX_8c99ea56cc137affd9526770cb"`)
    await queryRunner.query(`DROP INDEX "IDX_d4f92c09c980f549db94241b6c"`)
    await queryRunner.query(`ALTER TABLE "hand_ons" RENAME TO "temporary_hand_ons"`)
    await queryRunner.query(
      `CREATE TABLE "hand_ons" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "gameId" varchar(36) NOT NULL, "station" text NOT NULL, "fromId" varchar(36), "toId" varchar(36), "note" text NOT NULL DEFAULT (''), "at" text NOT NULL)`,
    )
    await queryRunner.query(
      `INSERT INTO "hand_ons"("id", "teamId", "gameId", "station", "fromId", "toId", "note", "at") SELECT "id", "teamId", "gameId", "station", "fromId", "toId", "note", "at" FROM "temporary_hand_ons"`,
    )
    await queryRunner.query(`DROP TABLE "temporary_hand_ons"`)
    await queryRunner.query(`CREATE INDEX "IDX_8c99ea56cc137affd9526770cb" ON "hand_ons" ("gameId", "at") `)
    await queryRunner.query(`CREATE INDEX "IDX_d4f92c09c980f549db94241b6c" ON "hand_ons" ("teamId", "at") `)
    await queryRunner.query(`DROP INDEX "IDX_e7dbe3dccca08919606f981b29"`)
    await queryRunner.query(`DROP INDEX "IDX_6fb8e81d69311e7c5e57ed59c3"`)
    await queryRunner.query(`ALTER TABLE "erasures" RENAME TO "temporary_erasures"`)
    await queryRunner.query(
      `CREATE TABLE "erasures" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "deletedAt" text, "kind" text NOT NULL, "subjectId" varchar(36) NOT NULL, "askedById" varchar(36), "dueAt" text NOT NULL, "stoppedAt" text, "stoppedById" varchar(36), "doneAt" text)`,
    )
    await queryRunner.query(
      `INSERT INTO "erasures"("id", "teamId", "version", "createdAt", "updatedAt", "deletedAt", "kind", "subjectId", "askedById", "dueAt", "stoppedAt", "stoppedById", "doneAt") SELECT "id", "teamId", "version", "createdAt", "updatedAt", "deletedAt", "kind", "subjectId", "askedById", "dueAt", "stoppedAt", "stoppedById", "doneAt" FROM "temporary_erasures"`,
    )
    await queryRunner.query(`DROP TABLE "temporary_erasures"`)
    await queryRunner.query(`CREATE INDEX "IDX_e7dbe3dccca08919606f981b29" ON "erasures" ("teamId") `)
    await queryRunner.query(`CREATE INDEX "IDX_6fb8e81d69311e7c5e57ed59c3" ON "erasures" ("dueAt") `)
    await queryRunner.query(`DROP INDEX "IDX_37e1cc613862a767f601c08eff"`)
    await queryRunner.query(`ALTER TABLE "copies" RENAME TO "temporary_copies"`)
    await queryRunner.query(
      `CREATE TABLE "copies" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "deletedAt" text, "sheetId" varchar(36) NOT NULL, "number" integer, "squadPlayerId" varchar(36), "way" text NOT NULL, "outAt" text, "backAt" text, "mailId" varchar(36))`,
    )
    await queryRunner.query(
      `INSERT INTO "copies"("id", "teamId", "version", "createdAt", "updatedAt", "deletedAt", "sheetId", "number", "squadPlayerId", "way", "outAt", "backAt", "mailId") SELECT "id", "teamId", "version", "createdAt", "updatedAt", "deletedAt", "sheetId", "number", "squadPlayerId", "way", "outAt", "backAt", "mailId" FROM "temporary_copies"`,
    )
    await queryRunner.query(`DROP TABLE "temporary_copies"`)
    await queryRunner.query(
      `CREATE UNIQUE INDEX "IDX_37e1cc613862a767f601c08eff" ON "copies" ("sheetId", "number") `,
    )
    await queryRunner.query(`DROP INDEX "IDX_1e80dce6b01b621d30078b1579"`)
    await queryRunner.query(`DROP INDEX "IDX_5ea93ea22714ae555356636d3d"`)
    await queryRunner.query(`ALTER TABLE "games" RENAME TO "temporary_games"`)
    await queryRunner.query(
      `CREATE TABLE "games" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "opponentId" varchar(36) NOT NULL, "tipOff" text NOT NULL, "place" text NOT NULL, "rulePack" text NOT NULL, "chooseBy" text, "deletedAt" text, "due" text, "holderId" varchar(36), "readAt" text, "readById" varchar(36), "notes" text NOT NULL DEFAULT (''), CONSTRAINT "FK_5ea93ea22714ae555356636d3dc" FOREIGN KEY ("opponentId") REFERENCES "opponents" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "games"("id", "teamId", "version", "createdAt", "updatedAt", "opponentId", "tipOff", "place", "rulePack", "chooseBy", "deletedAt", "due", "holderId", "readAt", "readById", "notes") SELECT "id", "teamId", "version", "createdAt", "updatedAt", "opponentId", "tipOff", "place", "rulePack", "chooseBy", "deletedAt", "due", "holderId", "readAt", "readById", "notes" FROM "temporary_games"`,
    )
    await queryRunner.query(`DROP TABLE "temporary_games"`)
    await queryRunner.query(`CREATE INDEX "IDX_1e80dce6b01b621d30078b1579" ON "games" ("teamId", "tipOff") `)
    await queryRunner.query(`CREATE INDEX "IDX_5ea93ea22714ae555356636d3d" ON "games" ("opponentId") `)
    await queryRunner.query(`DROP INDEX "IDX_7a5db8fd1061dec279d359176b"`)
    await queryRunner.query(`DROP INDEX "IDX_6860b148cb8124b004d3052ea3"`)
    await queryRunner.query(`DROP INDEX "IDX_d1846ad223eba024f4d843d55b"`)
    await queryRunner.query(`ALTER TABLE "changes" RENAME TO "temporary_changes"`)
    await queryRunner.query(
      `CREATE TABLE "changes" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "kind" text NOT NULL, "rowId" varchar(36) NOT NULL, "action" text NOT NULL, "personId" varchar(36), "at" text NOT NULL, "batchId" varchar(36), "fields" text NOT NULL)`,
    )
    await queryRunner.query(
      `INSERT INTO "changes"("id", "teamId", "kind", "rowId", "action", "personId", "at", "batchId", "fields") SELECT "id", "teamId", "kind", "rowId", "action", "personId", "at", "batchId", "fields" FROM "temporary_changes"`,
    )
    await queryRunner.query(`DROP TABLE "temporary_changes"`)
    await queryRunner.query(`CREATE INDEX "IDX_7a5db8fd1061dec279d359176b" ON "changes" ("rowId", "at") `)
    await queryRunner.query(`CREATE INDEX "IDX_6860b148cb8124b004d3052ea3" ON "changes" ("teamId", "at") `)
    await queryRunner.query(`CREATE INDEX "IDX_d1846ad223eba024f4d843d55b" ON "changes" ("batchId") `)
    await queryRunner.query(`DROP INDEX "IDX_f9dd154c90609a6263a2e65fe9"`)
    await queryRunner.query(`DROP INDEX "IDX_56f33bdd3871ff2bf7d1f2fc33"`)
    await queryRunner.query(`ALTER TABLE "rules" RENAME TO "temporary_rules"`)
    await queryRunner.query(
      `CREATE TABLE "rules" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "number" integer, "on" boolean NOT NULL, "body" text NOT NULL, CONSTRAINT "FK_56f33bdd3871ff2bf7d1f2fc33a" FOREIGN KEY ("teamId") REFERENCES "teams" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "rules"("id", "teamId", "version", "createdAt", "updatedAt", "number", "on", "body") SELECT "id", "teamId", "version", "createdAt", "updatedAt", "number", "on", "body" FROM "temporary_rules"`,
    )
    await queryRunner.query(`DROP TABLE "temporary_rules"`)
    await queryRunner.query(`CREATE INDEX "IDX_56f33bdd3871ff2bf7d1f2fc33" ON "rules" ("teamId") `)
    await queryRunner.query(`DROP INDEX "IDX_0497efad4a7a0e916576ff3dde"`)
    await queryRunner.query(`DROP INDEX "IDX_a2a0a26e0ae3d3101c1796d57d"`)
    await queryRunner.query(`DROP INDEX "IDX_d75981f4e452fbe445bd69f5ab"`)
    await queryRunner.query(`DROP INDEX "IDX_e26d9a35b166697be899b1ed3e"`)
    await queryRunner.query(`ALTER TABLE "possessions" RENAME TO "temporary_possessions"`)
    await queryRunner.query(
      `CREATE TABLE "possessions" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "scoutedGameId" varchar(36), "gameId" varchar(36), "frame" integer NOT NULL, "tripId" varchar(36), "number" integer NOT NULL, "period" integer, "clock" integer, "margin" integer, "trigger" text NOT NULL, "shape" text, "shapeVariant" text, "pickup" text, "trapsLogged" text, "outcome" text, "outcomePlace" text, "throwerGuard" text, "denied" text, "tookAway" text, "leftOpen" text, "onBall" text, "handler" text, "goalie" text, "shownShape" text, "crossedAt" real, "track" text, "note" text NOT NULL, "counterId" varchar(36), "rightCall" boolean, "runWell" boolean, "deletedAt" text, CONSTRAINT "CHK_84010d199d2cfb50c2289df971" CHECK ((("scoutedGameId" IS NULL) <> ("gameId" IS NULL))), CONSTRAINT "FK_1b69da19527bf8a038edfdf0d03" FOREIGN KEY ("counterId") REFERENCES "counters" ("id") ON DELETE SET NULL ON UPDATE NO ACTION, CONSTRAINT "FK_5fe5d0d98b44128946beea21d17" FOREIGN KEY ("gameId") REFERENCES "games" ("id") ON DELETE CASCADE ON UPDATE NO ACTION, CONSTRAINT "FK_2ca30a176df473847c4362d4bd9" FOREIGN KEY ("scoutedGameId") REFERENCES "scouted_games" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "possessions"("id", "teamId", "version", "createdAt", "updatedAt", "scoutedGameId", "gameId", "frame", "tripId", "number", "period", "clock", "margin", "trigger", "shape", "shapeVariant", "pickup", "trapsLogged", "outcome", "outcomePlace", "throwerGuard", "denied", "tookAway", "leftOpen", "onBall", "handler", "goalie", "shownShape", "crossedAt", "track", "note", "counterId", "rightCall", "runWell", "deletedAt") SELECT "id", "teamId", "version", "createdAt", "updatedAt", "scoutedGameId", "gameId", "frame", "tripId", "number", "period", "clock", "margin", "trigger", "shape", "shapeVariant", "pickup", "trapsLogged", "outcome", "outcomePlace", "throwerGuard", "denied", "tookAway", "leftOpen", "onBall", "handler", "goalie", "shownShape", "crossedAt", "track", "note", "counterId", "rightCall", "runWell", "deletedAt" FROM "temporary_possessions"`,
    )
    await queryRunner.query(`DROP TABLE "temporary_possessions"`)
    await queryRunner.query(`CREATE INDEX "IDX_0497efad4a7a0e916576ff3dde" ON "possessions" ("deletedAt") `)
    await queryRunner.query(
      `CREATE INDEX "IDX_a2a0a26e0ae3d3101c1796d57d" ON "possessions" ("teamId", "counterId") `,
    )
    await queryRunner.query(
      `CREATE INDEX "IDX_d75981f4e452fbe445bd69f5ab" ON "possessions" ("gameId", "number") `,
    )
    await queryRunner.query(
      `CREATE INDEX "IDX_e26d9a35b166697be899b1ed3e" ON "possessions" ("scoutedGameId", "number") `,
    )
    await queryRunner.query(`DROP INDEX "IDX_42bedd379e5e9945d65aba510d"`)
    await queryRunner.query(`ALTER TABLE "traps" RENAME TO "temporary_traps"`)
    await queryRunner.query(
      `CREATE TABLE "traps" ("id" varchar(36) PRIMARY KEY NOT NULL, "possessionId" varchar(36) NOT NULL, "position" integer NOT NULL, "x" real NOT NULL, "y" real NOT NULL, "t" real, "cue" text, "result" text, CONSTRAINT "FK_47746c8177370b5a8ca3eee8e17" FOREIGN KEY ("possessionId") REFERENCES "possessions" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "traps"("id", "possessionId", "position", "x", "y", "t", "cue", "result") SELECT "id", "possessionId", "position", "x", "y", "t", "cue", "result" FROM "temporary_traps"`,
    )
    await queryRunner.query(`DROP TABLE "temporary_traps"`)
    await queryRunner.query(
      `CREATE UNIQUE INDEX "IDX_42bedd379e5e9945d65aba510d" ON "traps" ("possessionId", "position") `,
    )
    await queryRunner.query(`DROP INDEX "IDX_790d7dde3088987d33f82aaf5e"`)
    await queryRunner.query(`ALTER TABLE "stills" RENAME TO "temporary_stills"`)
    await queryRunner.query(
      `CREATE TABLE "stills" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "possessionId" varchar(36) NOT NULL, "position" integer NOT NULL, "t" real, "caption" text NOT NULL, "width" integer NOT NULL, "height" integer NOT NULL, "digest" text NOT NULL, "createdAt" text NOT NULL, CONSTRAINT "FK_50ce0b14226fd3201bd98f14c68" FOREIGN KEY ("possessionId") REFERENCES "possessions" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "stills"("id", "teamId", "possessionId", "position", "t", "caption", "width", "height", "digest", "createdAt") SELECT "id", "teamId", "possessionId", "position", "t", "caption", "width", "height", "digest", "createdAt" FROM "temporary_stills"`,
    )
    await queryRunner.query(`DROP TABLE "temporary_stills"`)
    await queryRunner.query(
      `CREATE INDEX "IDX_790d7dde3088987d33f82aaf5e" ON "stills" ("possessionId", "position") `,
    )
    await queryRunner.query(`DROP INDEX "IDX_a05e68490af0d62392e4f56a1f"`)
    await queryRunner.query(`DROP INDEX "IDX_df2aa3f613e0d7e7cc3ff8b9f7"`)
    await queryRunner.query(`ALTER TABLE "scouted_games" RENAME TO "temporary_scouted_games"`)
    await queryRunner.query(
      `CREATE TABLE "scouted_games" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "opponentId" varchar(36) NOT NULL, "foe" text NOT NULL, "playedOn" text NOT NULL, "seen" text NOT NULL, "rulePack" text NOT NULL, "coverageKind" text NOT NULL, "coverageFrom" real, "coverageTo" real, "blowout" boolean NOT NULL, "finalScore" text, "scoutId" varchar(36), CONSTRAINT "FK_16bfc54a1a85e5fb45d92d66480" FOREIGN KEY ("scoutId") REFERENCES "people" ("id") ON DELETE SET NULL ON UPDATE NO ACTION, CONSTRAINT "FK_a05e68490af0d62392e4f56a1f5" FOREIGN KEY ("opponentId") REFERENCES "opponents" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "scouted_games"("id", "teamId", "version", "createdAt", "updatedAt", "opponentId", "foe", "playedOn", "seen", "rulePack", "coverageKind", "coverageFrom", "coverageTo", "blowout", "finalScore", "scoutId") SELECT "id", "teamId", "version", "createdAt", "updatedAt", "opponentId", "foe", "playedOn", "seen", "rulePack", "coverageKind", "coverageFrom", "coverageTo", "blowout", "finalScore", "scoutId" FROM "temporary_scouted_games"`,
    )
    await queryRunner.query(`DROP TABLE "temporary_scouted_games"`)
    await queryRunner.query(
      `CREATE INDEX "IDX_a05e68490af0d62392e4f56a1f" ON "scouted_games" ("opponentId") `,
    )
    await queryRunner.query(`CREATE INDEX "IDX_df2aa3f613e0d7e7cc3ff8b9f7" ON "scouted_games" ("teamId") `)
    await queryRunner.query(`DROP INDEX "IDX_a8f2967ffb040b892f27a7af4b"`)
    await queryRunner.query(`ALTER TABLE "memberships" RENAME TO "temporary_memberships"`)
    await queryRunner.query(
      `CREATE TABLE "memberships" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "personId" varchar(36) NOT NULL, "role" text NOT NULL, "squadPlayerId" varchar(36), CONSTRAINT "FK_1a304d463683ba65a3cc9e7907b" FOREIGN KEY ("squadPlayerId") REFERENCES "squad_players" ("id") ON DELETE SET NULL ON UPDATE NO ACTION, CONSTRAINT "FK_9b5139de55b7990de8ee069b8fc" FOREIGN KEY ("personId") REFERENCES "people" ("id") ON DELETE CASCADE ON UPDATE NO ACTION, CONSTRAINT "FK_f348d359485ec8cf7737253f3d5" FOREIGN KEY ("teamId") REFERENCES "teams" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "memberships"("id", "teamId", "personId", "role", "squadPlayerId") SELECT "id", "teamId", "personId", "role", "squadPlayerId" FROM "temporary_memberships"`,
    )
    await queryRunner.query(`DROP TABLE "temporary_memberships"`)
    await queryRunner.query(
      `CREATE UNIQUE INDEX "IDX_a8f2967ffb040b892f27a7af4b" ON "memberships" ("personId", "teamId") `,
    )
    await queryRunner.query(`DROP INDEX "IDX_c300d579f1693ceb052085de28"`)
    await queryRunner.query(`ALTER TABLE "counters" RENAME TO "temporary_counters"`)
    await queryRunner.query(
      `CREATE TABLE "counters" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "name" text NOT NULL, "family" text NOT NULL, "body" text NOT NULL, CONSTRAINT "FK_c300d579f1693ceb052085de28c" FOREIGN KEY ("teamId") REFERENCES "teams" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "counters"("id", "teamId", "version", "createdAt", "updatedAt", "name", "family", "body") SELECT "id", "teamId", "version", "createdAt", "updatedAt", "name", "family", "body" FROM "temporary_counters"`,
    )
    await queryRunner.query(`DROP TABLE "temporary_counters"`)
    await queryRunner.query(`CREATE INDEX "IDX_c300d579f1693ceb052085de28" ON "counters" ("teamId") `)
    await queryRunner.query(`ALTER TABLE "squad_players" RENAME TO "temporary_squad_players"`)
    await queryRunner.query(
      `CREATE TABLE "squad_players" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "jersey" integer NOT NULL, "firstName" text NOT NULL, "lastName" text NOT NULL, "skills" text NOT NULL, "outUntil" text, CONSTRAINT "FK_7a46107eadbb77193e9e0427901" FOREIGN KEY ("teamId") REFERENCES "teams" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "squad_players"("id", "teamId", "version", "createdAt", "updatedAt", "jersey", "firstName", "lastName", "skills", "outUntil") SELECT "id", "teamId", "version", "createdAt", "updatedAt", "jersey", "firstName", "lastName", "skills", "outUntil" FROM "temporary_squad_players"`,
    )
    await queryRunner.query(`DROP TABLE "temporary_squad_players"`)
    await queryRunner.query(`DROP INDEX "IDX_ad690ddf7a966e930acfa2f94d"`)
    await queryRunner.query(`DROP INDEX "IDX_d0dc9db458efb540c5ecda386c"`)
    await queryRunner.query(`ALTER TABLE "sheets" RENAME TO "temporary_sheets"`)
    await queryRunner.query(
      `CREATE TABLE "sheets" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "planId" varchar(36) NOT NULL, "createdAt" text NOT NULL, CONSTRAINT "FK_d0dc9db458efb540c5ecda386c5" FOREIGN KEY ("planId") REFERENCES "plans" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "sheets"("id", "teamId", "planId", "createdAt") SELECT "id", "teamId", "planId", "createdAt" FROM "temporary_sheets"`,
    )
    await queryRunner.query(`DROP TABLE "temporary_sheets"`)
    await queryRunner.query(`CREATE INDEX "IDX_ad690ddf7a966e930acfa2f94d" ON "sheets" ("teamId") `)
    await queryRunner.query(`CREATE UNIQUE INDEX "IDX_d0dc9db458efb540c5ecda386c" ON "sheets" ("planId") `)
    await queryRunner.query(`DROP INDEX "IDX_c52bfc7c313a925cfd2d8e1c52"`)
    await queryRunner.query(`ALTER TABLE "plans" RENAME TO "temporary_plans"`)
    await queryRunner.query(
      `CREATE TABLE "plans" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "gameId" varchar(36) NOT NULL, "number" integer NOT NULL, "firstCallId" varchar(36), "changeUpId" varchar(36), "notThisGame" text NOT NULL, "roles" text NOT NULL, "keys" text NOT NULL, "reason" text NOT NULL, "frozen" text, "signedAt" text, "signedById" varchar(36), CONSTRAINT "FK_f08d419658041cc143248ede723" FOREIGN KEY ("signedById") REFERENCES "people" ("id") ON DELETE SET NULL ON UPDATE NO ACTION, CONSTRAINT "FK_e3369236b661831e6092cc6ea50" FOREIGN KEY ("gameId") REFERENCES "games" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "plans"("id", "teamId", "version", "createdAt", "updatedAt", "gameId", "number", "firstCallId", "changeUpId", "notThisGame", "roles", "keys", "reason", "frozen", "signedAt", "signedById") SELECT "id", "teamId", "version", "createdAt", "updatedAt", "gameId", "number", "firstCallId", "changeUpId", "notThisGame", "roles", "keys", "reason", "frozen", "signedAt", "signedById" FROM "temporary_plans"`,
    )
    await queryRunner.query(`DROP TABLE "temporary_plans"`)
    await queryRunner.query(
      `CREATE UNIQUE INDEX "IDX_c52bfc7c313a925cfd2d8e1c52" ON "plans" ("gameId", "number") `,
    )
    await queryRunner.query(`DROP INDEX "IDX_1e80dce6b01b621d30078b1579"`)
    await queryRunner.query(`DROP INDEX "IDX_5ea93ea22714ae555356636d3d"`)
    await queryRunner.query(`ALTER TABLE "games" RENAME TO "temporary_games"`)
    await queryRunner.query(
      `CREATE TABLE "games" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "opponentId" varchar(36) NOT NULL, "tipOff" text NOT NULL, "place" text NOT NULL, "rulePack" text NOT NULL, "chooseBy" text, CONSTRAINT "FK_5ea93ea22714ae555356636d3dc" FOREIGN KEY ("opponentId") REFERENCES "opponents" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "games"("id", "teamId", "version", "createdAt", "updatedAt", "opponentId", "tipOff", "place", "rulePack", "chooseBy") SELECT "id", "teamId", "version", "createdAt", "updatedAt", "opponentId", "tipOff", "place", "rulePack", "chooseBy" FROM "temporary_games"`,
    )
    await queryRunner.query(`DROP TABLE "temporary_games"`)
    await queryRunner.query(`CREATE INDEX "IDX_1e80dce6b01b621d30078b1579" ON "games" ("teamId", "tipOff") `)
    await queryRunner.query(`CREATE INDEX "IDX_5ea93ea22714ae555356636d3d" ON "games" ("opponentId") `)
    await queryRunner.query(`DROP INDEX "IDX_5154c6f25ac30db892aa0ac449"`)
    await queryRunner.query(`ALTER TABLE "opponents" RENAME TO "temporary_opponents"`)
    await queryRunner.query(
      `CREATE TABLE "opponents" ("id" varchar(36) PRIMARY KEY NOT NULL, "teamId" varchar(36) NOT NULL, "version" integer NOT NULL, "createdAt" text NOT NULL, "updatedAt" text NOT NULL, "name" text NOT NULL, "shortName" text NOT NULL, CONSTRAINT "FK_5154c6f25ac30db892aa0ac4498" FOREIGN KEY ("teamId") REFERENCES "teams" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`,
    )
    await queryRunner.query(
      `INSERT INTO "opponents"("id", "teamId", "version", "createdAt", "updatedAt", "name", "shortName") SELECT "id", "teamId", "version", "createdAt", "updatedAt", "name", "shortName" FROM "temporary_opponents"`,
    )
    await queryRunner.query(`DROP TABLE "temporary_opponents"`)
    await queryRunner.query(`CREATE INDEX "IDX_5154c6f25ac30db892aa0ac449" ON "opponents" ("teamId") `)
    await queryRunner.query(`ALTER TABLE "teams" RENAME TO "temporary_teams"`)
    await queryRunner.query(
      `CREATE TABLE "teams" ("id" varchar(36) PRIMARY KEY NOT NULL, "name" text NOT NULL, "squadName" text NOT NULL, "timeZone" text NOT NULL, "season" text NOT NULL, "rulePack" text NOT NULL, "createdAt" text NOT NULL)`,
    )
    await queryRunner.query(
      `INSERT INTO "teams"("id", "name", "squadName", "timeZone", "season", "rulePack", "createdAt") SELECT "id", "name", "squadName", "timeZone", "season", "rulePack", "createdAt" FROM "temporary_teams"`,
    )
    await queryRunner.query(`DROP TABLE "temporary_teams"`)
    await queryRunner.query(`DROP INDEX "IDX_0b5136d56d15f10fe676f6d7c8"`)
    await queryRunner.query(`DROP INDEX "IDX_3de04e9d6024588834a0179896"`)
    await queryRunner.query(`DROP TABLE "practice_reps"`)
    await queryRunner.query(`DROP INDEX "IDX_954b4a3770543d4daedbb693e3"`)
    await queryRunner.query(`DROP INDEX "IDX_c467e402063162bfcfede4c7d6"`)
    await queryRunner.query(`DROP TABLE "practices"`)
    await queryRunner.query(`DROP INDEX "IDX_7f6aae0fcc807c9e7194ca5cc4"`)
    await queryRunner.query(`DROP INDEX "IDX_d7b6b606688f35879dc07d4278"`)
    await queryRunner.query(`DROP TABLE "password_resets"`)
    await queryRunner.query(`DROP INDEX "IDX_60cadb07d3b5225ef1ace353d6"`)
    await queryRunner.query(`DROP TABLE "opponent_players"`)
    await queryRunner.query(`DROP INDEX "IDX_75e0b6d0a4d5a2cdaf59edb20a"`)
    await queryRunner.query(`DROP TABLE "openings"`)
    await queryRunner.query(`DROP INDEX "IDX_35cb78fb93442d2da1e94d483e"`)
    await queryRunner.query(`DROP INDEX "IDX_182b2632a42ce2d18955036a3f"`)
    await queryRunner.query(`DROP INDEX "IDX_bbdc05b09d5283dc0ddc2fc8eb"`)
    await queryRunner.query(`DROP TABLE "mails"`)
    await queryRunner.query(`DROP INDEX "IDX_113cb1411bac0e764b922699d4"`)
    await queryRunner.query(`DROP INDEX "IDX_a6eb6f2543de8a5a4c148b32a1"`)
    await queryRunner.query(`DROP TABLE "invitations"`)
    await queryRunner.query(`DROP INDEX "IDX_8c99ea56cc137affd9526770cb"`)
    await queryRunner.query(`DROP INDEX "IDX_d4f92c09c980f549db94241b6c"`)
    await queryRunner.query(`DROP TABLE "hand_ons"`)
    await queryRunner.query(`DROP INDEX "IDX_e7dbe3dccca08919606f981b29"`)
    await queryRunner.query(`DROP INDEX "IDX_6fb8e81d69311e7c5e57ed59c3"`)
    await queryRunner.query(`DROP TABLE "erasures"`)
    await queryRunner.query(`DROP INDEX "IDX_37e1cc613862a767f601c08eff"`)
    await queryRunner.query(`DROP TABLE "copies"`)
    await queryRunner.query(`DROP INDEX "IDX_7a5db8fd1061dec279d359176b"`)
    await queryRunner.query(`DROP INDEX "IDX_6860b148cb8124b004d3052ea3"`)
    await queryRunner.query(`DROP INDEX "IDX_d1846ad223eba024f4d843d55b"`)
    await queryRunner.query(`DROP TABLE "changes"`)
    await queryRunner.query(
      `CREATE UNIQUE INDEX "IDX_4c5b2473c12c6c039e282b8079" ON "squad_players" ("teamId", "jersey") `,
    )
    await queryRunner.query('PRAGMA legacy_alter_table = OFF')
  }
}
