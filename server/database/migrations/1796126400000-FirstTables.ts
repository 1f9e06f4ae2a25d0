import type { MigrationInterface, QueryRunner } from 'typeorm'

export class FirstTables1796126400000 implements MigrationInterface {
  name = 'FirstTables1796126400000'

  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`CREATE TABLE "teams" ("id" varchar(36) PRIMARY KEY NOT NULL,
        "name" text NOT NULL,
        "squadName" text NOT NULL,
        "timeZone" text NOT NULL,
        "season" text NOT NULL,
        "rulePack" text NOT NULL,
        "createdAt" text NOT NULL)`)
    await queryRunner.query(`CREATE TABLE "people" ("id" varchar(36) PRIMARY KEY NOT NULL,
        "email" text NOT NULL,
        "name" text NOT NULL,
        "passwordHash" text NOT NULL,
        "createdAt" text NOT NULL)`)
    await queryRunner.query(`CREATE TABLE "sessions" ("id" text PRIMARY KEY NOT NULL,
        "data" text NOT NULL,
        "expiresAt" integer NOT NULL)`)
    await queryRunner.query(`CREATE TABLE "squad_players" ("id" varchar(36) PRIMARY KEY NOT NULL,
        "teamId" varchar(36) NOT NULL,
        "version" integer NOT NULL,
        "createdAt" text NOT NULL,
        "updatedAt" text NOT NULL,
        "jersey" integer NOT NULL,
        "firstName" text NOT NULL,
        "lastName" text NOT NULL,
        "skills" text NOT NULL,
        "outUntil" text,
        CONSTRAINT "FK_7a46107eadbb77193e9e0427901" FOREIGN KEY ("teamId") REFERENCES "teams" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`)
    await queryRunner.query(`CREATE TABLE "memberships" ("id" varchar(36) PRIMARY KEY NOT NULL,
        "teamId" varchar(36) NOT NULL,
        "personId" varchar(36) NOT NULL,
        "role" text NOT NULL,
        "squadPlayerId" varchar(36),
        CONSTRAINT "FK_f348d359485ec8cf7737253f3d5" FOREIGN KEY ("teamId") REFERENCES "teams" ("id") ON DELETE CASCADE ON UPDATE NO ACTION,
        CONSTRAINT "FK_9b5139de55b7990de8ee069b8fc" FOREIGN KEY ("personId") REFERENCES "people" ("id") ON DELETE CASCADE ON UPDATE NO ACTION,
        CONSTRAINT "FK_1a304d463683ba65a3cc9e7907b" FOREIGN KEY ("squadPlayerId") REFERENCES "squad_players" ("id") ON DELETE SET NULL ON UPDATE NO ACTION)`)
    await queryRunner.query(`CREATE TABLE "opponents" ("id" varchar(36) PRIMARY KEY NOT NULL,
        "teamId" varchar(36) NOT NULL,
        "version" integer NOT NULL,
        "createdAt" text NOT NULL,
        "updatedAt" text NOT NULL,
        "name" text NOT NULL,
        "shortName" text NOT NULL,
        CONSTRAINT "FK_5154c6f25ac30db892aa0ac4498" FOREIGN KEY ("teamId") REFERENCES "teams" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`)
    await queryRunner.query(`CREATE TABLE "games" ("id" varchar(36) PRIMARY KEY NOT NULL,
        "teamId" varchar(36) NOT NULL,
        "version" integer NOT NULL,
        "createdAt" text NOT NULL,
        "updatedAt" text NOT NULL,
        "opponentId" varchar(36) NOT NULL,
        "tipOff" text NOT NULL,
        "place" text NOT NULL,
        "rulePack" text NOT NULL,
        "chooseBy" text,
        CONSTRAINT "FK_5ea93ea22714ae555356636d3dc" FOREIGN KEY ("opponentId") REFERENCES "opponents" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`)
    await queryRunner.query(`CREATE TABLE "scouted_games" ("id" varchar(36) PRIMARY KEY NOT NULL,
        "teamId" varchar(36) NOT NULL,
        "version" integer NOT NULL,
        "createdAt" text NOT NULL,
        "updatedAt" text NOT NULL,
        "opponentId" varchar(36) NOT NULL,
        "foe" text NOT NULL,
        "playedOn" text NOT NULL,
        "seen" text NOT NULL,
        "rulePack" text NOT NULL,
        "coverageKind" text NOT NULL,
        "coverageFrom" real,
        "coverageTo" real,
        "blowout" boolean NOT NULL,
        "finalScore" text,
        "scoutId" varchar(36),
        CONSTRAINT "FK_a05e68490af0d62392e4f56a1f5" FOREIGN KEY ("opponentId") REFERENCES "opponents" ("id") ON DELETE CASCADE ON UPDATE NO ACTION,
        CONSTRAINT "FK_16bfc54a1a85e5fb45d92d66480" FOREIGN KEY ("scoutId") REFERENCES "people" ("id") ON DELETE SET NULL ON UPDATE NO ACTION)`)
    await queryRunner.query(`CREATE TABLE "counters" ("id" varchar(36) PRIMARY KEY NOT NULL,
        "teamId" varchar(36) NOT NULL,
        "version" integer NOT NULL,
        "createdAt" text NOT NULL,
        "updatedAt" text NOT NULL,
        "name" text NOT NULL,
        "family" text NOT NULL,
        "body" text NOT NULL,
        CONSTRAINT "FK_c300d579f1693ceb052085de28c" FOREIGN KEY ("teamId") REFERENCES "teams" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`)
    await queryRunner.query(`CREATE TABLE "rules" ("id" varchar(36) PRIMARY KEY NOT NULL,
        "teamId" varchar(36) NOT NULL,
        "version" integer NOT NULL,
        "createdAt" text NOT NULL,
        "updatedAt" text NOT NULL,
        "number" integer,
        "on" boolean NOT NULL,
        "body" text NOT NULL,
        CONSTRAINT "FK_56f33bdd3871ff2bf7d1f2fc33a" FOREIGN KEY ("teamId") REFERENCES "teams" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`)
    await queryRunner.query(`CREATE TABLE "possessions" ("id" varchar(36) PRIMARY KEY NOT NULL,
        "teamId" varchar(36) NOT NULL,
        "version" integer NOT NULL,
        "createdAt" text NOT NULL,
        "updatedAt" text NOT NULL,
        "scoutedGameId" varchar(36),
        "gameId" varchar(36),
        "frame" integer NOT NULL,
        "tripId" varchar(36),
        "number" integer NOT NULL,
        "period" integer,
        "clock" integer,
        "margin" integer,
        "trigger" text NOT NULL,
        "shape" text,
        "shapeVariant" text,
        "pickup" text,
        "trapsLogged" text,
        "outcome" text,
        "outcomePlace" text,
        "throwerGuard" text,
        "denied" text,
        "tookAway" text,
        "leftOpen" text,
        "onBall" text,
        "handler" text,
        "goalie" text,
        "shownShape" text,
        "crossedAt" real,
        "track" text,
        "note" text NOT NULL,
        "counterId" varchar(36),
        "rightCall" boolean,
        "runWell" boolean,
        "deletedAt" text,
        CONSTRAINT "CHK_84010d199d2cfb50c2289df971" CHECK (("scoutedGameId" IS NULL) <> ("gameId" IS NULL)),
        CONSTRAINT "FK_2ca30a176df473847c4362d4bd9" FOREIGN KEY ("scoutedGameId") REFERENCES "scouted_games" ("id") ON DELETE CASCADE ON UPDATE NO ACTION,
        CONSTRAINT "FK_5fe5d0d98b44128946beea21d17" FOREIGN KEY ("gameId") REFERENCES "games" ("id") ON DELETE CASCADE ON UPDATE NO ACTION,
        CONSTRAINT "FK_1b69da19527bf8a038edfdf0d03" FOREIGN KEY ("counterId") REFERENCES "counters" ("id") ON DELETE SET NULL ON UPDATE NO ACTION)`)
    await queryRunner.query(`CREATE TABLE "traps" ("id" varchar(36) PRIMARY KEY NOT NULL,
        "possessionId" varchar(36) NOT NULL,
        "position" integer NOT NULL,
        "x" real NOT NULL,
        "y" real NOT NULL,
        "t" real,
        "cue" text,
        "result" text,
        CONSTRAINT "FK_47746c8177370b5a8ca3eee8e17" FOREIGN KEY ("possessionId") REFERENCES "possessions" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`)
    await queryRunner.query(`CREATE TABLE "stills" ("id" varchar(36) PRIMARY KEY NOT NULL,
        "teamId" varchar(36) NOT NULL,
        "possessionId" varchar(36) NOT NULL,
        "position" integer NOT NULL,
        "t" real,
        "caption" text NOT NULL,
        "width" integer NOT NULL,
        "height" integer NOT NULL,
        "digest" text NOT NULL,
        "createdAt" text NOT NULL,
        CONSTRAINT "FK_50ce0b14226fd3201bd98f14c68" FOREIGN KEY ("possessionId") REFERENCES "possessions" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`)
    await queryRunner.query(`CREATE TABLE "plans" ("id" varchar(36) PRIMARY KEY NOT NULL,
        "teamId" varchar(36) NOT NULL,
        "version" integer NOT NULL,
        "createdAt" text NOT NULL,
        "updatedAt" text NOT NULL,
        "gameId" varchar(36) NOT NULL,
        "number" integer NOT NULL,
        "firstCallId" varchar(36),
        "changeUpId" varchar(36),
        "notThisGame" text NOT NULL,
        "roles" text NOT NULL,
        "keys" text NOT NULL,
        "reason" text NOT NULL,
        "frozen" text,
        "signedAt" text,
        "signedById" varchar(36),
        CONSTRAINT "FK_e3369236b661831e6092cc6ea50" FOREIGN KEY ("gameId") REFERENCES "games" ("id") ON DELETE CASCADE ON UPDATE NO ACTION,
        CONSTRAINT "FK_f08d419658041cc143248ede723" FOREIGN KEY ("signedById") REFERENCES "people" ("id") ON DELETE SET NULL ON UPDATE NO ACTION)`)
    await queryRunner.query(`CREATE TABLE "sheets" ("id" varchar(36) PRIMARY KEY NOT NULL,
        "teamId" varchar(36) NOT NULL,
        "planId" varchar(36) NOT NULL,
        "createdAt" text NOT NULL,
        CONSTRAINT "FK_d0dc9db458efb540c5ecda386c5" FOREIGN KEY ("planId") REFERENCES "plans" ("id") ON DELETE CASCADE ON UPDATE NO ACTION)`)
    await queryRunner.query(`CREATE INDEX "IDX_0497efad4a7a0e916576ff3dde" ON "possessions" ("deletedAt") `)
    await queryRunner.query(`CREATE INDEX "IDX_1e80dce6b01b621d30078b1579" ON "games" ("teamId", "tipOff") `)
    await queryRunner.query(
      `CREATE UNIQUE INDEX "IDX_42bedd379e5e9945d65aba510d" ON "traps" ("possessionId", "position") `,
    )
    await queryRunner.query(
      `CREATE UNIQUE INDEX "IDX_4c5b2473c12c6c039e282b8079" ON "squad_players" ("teamId", "jersey") `,
    )
    await queryRunner.query(`CREATE INDEX "IDX_50762206f116cd47d1c3fec396" ON "sessions" ("expiresAt") `)
    await queryRunner.query(`CREATE INDEX "IDX_5154c6f25ac30db892aa0ac449" ON "opponents" ("teamId") `)
    await queryRunner.query(`CREATE INDEX "IDX_56f33bdd3871ff2bf7d1f2fc33" ON "rules" ("teamId") `)
    await queryRunner.query(`CREATE INDEX "IDX_5ea93ea22714ae555356636d3d" ON "games" ("opponentId") `)
    await queryRunner.query(
      `CREATE INDEX "IDX_790d7dde3088987d33f82aaf5e" ON "stills" ("possessionId", "position") `,
    )
    await queryRunner.query(
      `CREATE INDEX "IDX_a05e68490af0d62392e4f56a1f" ON "scouted_games" ("opponentId") `,
    )
    await queryRunner.query(
      `CREATE INDEX "IDX_a2a0a26e0ae3d3101c1796d57d" ON "possessions" ("teamId", "counterId") `,
    )
    await queryRunner.query(
      `CREATE UNIQUE INDEX "IDX_a8f2967ffb040b892f27a7af4b" ON "memberships" ("personId", "teamId") `,
    )
    await queryRunner.query(`CREATE INDEX "IDX_ad690ddf7a966e930acfa2f94d" ON "sheets" ("teamId") `)
    await queryRunner.query(`CREATE INDEX "IDX_c300d579f1693ceb052085de28" ON "counters" ("teamId") `)
    await queryRunner.query(
      `CREATE UNIQUE INDEX "IDX_c52bfc7c313a925cfd2d8e1c52" ON "plans" ("gameId", "number") `,
    )
    await queryRunner.query(`CREATE UNIQUE INDEX "IDX_c77e8752faa45901af2b245dff" ON "people" ("email") `)
    await queryRunner.query(`CREATE UNIQUE INDEX "IDX_d0dc9db458efb540c5ecda386c" ON "sheets" ("planId") `)
    await queryRunner.query(
      `CREATE INDEX "IDX_d75981f4e452fbe445bd69f5ab" ON "possessions" ("gameId", "number") `,
    )
    await queryRunner.query(`CREATE INDEX "IDX_df2aa3f613e0d7e7cc3ff8b9f7" ON "scouted_games" ("teamId") `)
    await queryRunner.query(
      `CREATE INDEX "IDX_e26d9a35b166697be899b1ed3e" ON "possessions" ("scoutedGameId", "number") `,
    )
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`DROP TABLE "sheets"`)
    await queryRunner.query(`DROP TABLE "plans"`)
    await queryRunner.query(`DROP TABLE "stills"`)
    await queryRunner.query(`DROP TABLE "traps"`)
    await queryRunner.query(`DROP TABLE "possessions"`)
    await queryRunner.query(`DROP TABLE "rules"`)
    await queryRunner.query(`DROP TABLE "counters"`)
    await queryRunner.query(`DROP TABLE "scouted_games"`)
    await queryRunner.query(`DROP TABLE "games"`)
    await queryRunner.query(`DROP TABLE "opponents"`)
    await queryRunner.query(`DROP TABLE "memberships"`)
    await queryRunner.query(`DROP TABLE "squad_players"`)
    await queryRunner.query(`DROP TABLE "sessions"`)
    await queryRunner.query(`DROP TABLE "people"`)
    await queryRunner.query(`DROP TABLE "teams"`)
  }
}
