-- The two accounts of the app; the application's gets its rights table by table from the migrations.
CREATE DATABASE IF NOT EXISTS heartcut CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci;
CREATE USER IF NOT EXISTS 'heartcut_app'@'%' IDENTIFIED BY 'heartcut-local-app';
CREATE USER IF NOT EXISTS 'heartcut_migrate'@'%' IDENTIFIED BY 'heartcut-local-migrate';
GRANT ALL ON heartcut.* TO 'heartcut_migrate'@'%' WITH GRANT OPTION;
