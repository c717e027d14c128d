-- Two logins and a database for Levelgaze on a PostgreSQL of yours (15 or newer). As a superuser:
--   psql -v owner_password=… -v app_password=… -f roles.sql
create role levelgaze_owner login password :'owner_password';
create role levelgaze_app login password :'app_password';
create database levelgaze owner levelgaze_owner template template0 encoding 'UTF8';
revoke all on database levelgaze from public;
grant connect, temporary on database levelgaze to levelgaze_app;
