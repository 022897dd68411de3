import { Module } from '@nestjs/common';
import { ScheduleModule } from '@nestjs/schedule';

import { AuditModule } from '#server/audit/audit.module';
import { AuthModule } from '#server/auth/auth.module';
import { CifModule } from '#server/cif/cif.module';
import { ConfigModule } from '#server/config/config.module';
import { DatabaseModule } from '#server/database/database.module';
import { DemoModule } from '#server/demo/demo.module';
import { ElectrostaticsModule } from '#server/electrostatics/electrostatics.module';
import { ReportModule } from '#server/energetics/report/report.module';
import { HealthModule } from '#server/health/health.module';
import { HttpModule } from '#server/http/http.module';
import { InstallationModule } from '#server/installation/installation.module';
import { LatticesModule } from '#server/lattices/lattices.module';
import { PrototypesModule } from '#server/prototypes/prototypes.module';
import { ReviewModule } from '#server/review/review.module';
import { SharingModule } from '#server/sharing/sharing.module';
import { SymmetryModule } from '#server/symmetry/symmetry.module';
import { UsersModule } from '#server/users/users.module';
import { DataValuesModule } from '#server/workspaces/data-values/data-values.module';
import { WorkspacesModule } from '#server/workspaces/workspaces.module';

@Module({
  imports: [
    ConfigModule,
    DatabaseModule,
    HttpModule,
    ScheduleModule.forRoot(),
    HealthModule,
    InstallationModule,
    UsersModule,
    AuditModule,
    AuthModule,
    WorkspacesModule,
    DataValuesModule,
    SymmetryModule,
    CifModule,
    PrototypesModule,
    ElectrostaticsModule,
    LatticesModule,
    ReviewModule,
    SharingModule,
    ReportModule,
    DemoModule,
  ],
})
export class AppModule {}
